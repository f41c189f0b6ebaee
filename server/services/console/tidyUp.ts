import type { ConsoleDatabase } from '../../models/ConsoleDatabase';
import { remindOfExpiry } from '../keys/remindOfExpiry';
import type { Outbox } from '../mail/Outbox';

/** What nobody needs any more. Links and passes are of no use once they are over; sent mails are a log for a while. */
const OVER = [
  "DELETE FROM sign_ups WHERE expires_at < service_now() - interval '1 day'",
  "DELETE FROM email_tokens WHERE expires_at < service_now() - interval '1 day'",
  'DELETE FROM key_passes WHERE expires_at < service_now()',
  `DELETE FROM sessions WHERE expires_at < service_now() - interval '30 days'
     OR ended_at < service_now() - interval '30 days'`,
  "DELETE FROM mail_outbox WHERE sealed IS NULL AND created_at < service_now() - interval '90 days'",
  'DELETE FROM throttles WHERE expire < extract(epoch FROM now()) * 1000 - 86400000',
  "DELETE FROM usage_hours WHERE hour < service_now() - interval '25 months'",
  "DELETE FROM meter_refunds WHERE created_at < service_now() - interval '60 days'",
  "DELETE FROM quota_alerts WHERE created_at < service_now() - interval '60 days'",
];

/** Tidies up, and reminds of keys that are about to expire. */
export async function tidyUp(database: ConsoleDatabase, outbox: Outbox, publicUrl: string): Promise<void> {
  for (const sql of OVER) await database.rows(sql, []);
  await remindOfExpiry(database, outbox, publicUrl);
}
