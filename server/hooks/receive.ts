import { inboundForecastSchema } from '../../shared/api/inbound-forecast.ts';
import { plainMessages } from '../../shared/api/messages.ts';
import { execute } from '../database/connection.ts';
import { unsealWebhookSecret } from '../delivery/webhook/secrets.ts';
import { HttpProblem, invalid, problemsOf } from '../http/problem.ts';
import type { Services } from '../services.ts';
import { checkSignature } from './signature.ts';

function parsed(body: Buffer): unknown {
  try {
    return JSON.parse(body.toString('utf8'));
  } catch {
    throw new HttpProblem(400, 'The body is not valid JSON.');
  }
}

/**
 * Takes an inbound forecast message in: signature, date and body are checked, then it is kept for the inbox. A message of an id that
 * is known is answered as before and not processed again.
 * @param body the bytes as they came: the signature covers them
 * @returns the message's id and whether it is new
 * @throws HttpProblem 401 for anything about sender or signature, 400 or 422 for the body
 */
export async function receiveForecast({ models, sequelize, settings, clock }: Services, sourceId: string, header: (name: string) => string | undefined, body: Buffer): Promise<{ id: string; isNew: boolean }> {
  const now = clock.now();
  const source = await models.inboundSources.findOne({ where: { id: sourceId, archivedAt: null }, raw: true });
  const signed = checkSignature(
    { 'webhook-id': header('webhook-id'), 'webhook-timestamp': header('webhook-timestamp'), 'webhook-signature': header('webhook-signature') },
    body,
    source ? [unsealWebhookSecret(settings.secret, source.secretSealed)] : [],
    now,
  );
  // A source that does not exist answers like a wrong signature: ids reveal nothing.
  if ('refused' in signed) throw new HttpProblem(401, signed.refused);
  const message = inboundForecastSchema.safeParse(parsed(body), { error: plainMessages });
  if (!message.success) throw invalid(problemsOf(message.error));
  const added = await execute(
    sequelize,
    'INSERT IGNORE INTO inbound_messages (source_id, message_id, received_at, body) VALUES (:sourceId, :messageId, :now, :body)',
    { sourceId, messageId: signed.id, now, body: JSON.stringify(message.data) },
  );
  await models.inboundSources.update({ lastReceivedAt: now }, { where: { id: sourceId } });
  return { id: signed.id, isNew: added > 0 };
}
