import type { ButtonHTMLAttributes, ReactNode } from 'react';
import { Link, type LinkProps } from 'react-router-dom';
import { Icon, type IconName } from './icon.tsx';

export type ButtonVariant = 'primary' | 'quiet' | 'link';

const looks: Record<ButtonVariant, string> = {
  primary: 'bg-needle text-needle-on hover:bg-needle-deep px-5 font-semibold rounded-lg',
  quiet: 'border-[1.5px] border-ink/25 hover:border-ink/60 px-5 rounded-lg',
  link: 'underline underline-offset-4 decoration-ink/40 hover:decoration-ink px-1',
};
const common = 'inline-flex min-h-touch min-w-touch items-center justify-center gap-2 text-center disabled:opacity-60';

interface ButtonProps extends ButtonHTMLAttributes<HTMLButtonElement> {
  variant?: ButtonVariant;
  /** Under way: the button waits and says so. */
  busy?: boolean;
}

/** A button as big as a wet glove needs. */
export function Button({ variant = 'primary', busy = false, type = 'button', className = '', disabled, children, ...rest }: ButtonProps) {
  return (
    <button type={type} className={`${common} ${looks[variant]} ${className}`} disabled={disabled === true || busy} aria-busy={busy} {...rest}>
      {children}
    </button>
  );
}

interface IconButtonProps extends Omit<ButtonHTMLAttributes<HTMLButtonElement>, 'children'> {
  icon: IconName;
  /** What it does, for those who do not see the drawing. */
  label: string;
}

/** A drawing to press; its name is read aloud and shown when one rests on it. */
export const IconButton = ({ icon, label, type = 'button', className = '', ...rest }: IconButtonProps) => (
  <button type={type} aria-label={label} title={label} className={`inline-flex size-12 items-center justify-center rounded-lg hover:bg-paper-sunk ${className}`} {...rest}>
    <Icon name={icon} />
  </button>
);

interface ButtonLinkProps extends LinkProps {
  variant?: ButtonVariant;
  children: ReactNode;
}

/** A link that looks like a button. */
export function ButtonLink({ variant = 'quiet', className = '', ...rest }: ButtonLinkProps) {
  return <Link className={`${common} ${looks[variant]} ${className}`} {...rest} />;
}
