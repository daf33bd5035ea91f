import { en, type MessageKey, type MessageParams } from './en.ts';

/** Says a message of the kit, its `{names}` filled in. */
export type Say = (key: MessageKey, params?: MessageParams) => string;

/** English. Other languages are further tables of the same keys. */
export const sayEnglish: Say = (key, params = {}) => en[key].replace(/\{(\w+)\}/g, (_, name: string) => String(params[name] ?? ''));

/** The words of the kit in the reader's language: `t('undo')`, `t('table.count', { shown, total })`. */
export const useT = (): Say => sayEnglish;
