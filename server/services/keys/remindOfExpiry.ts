import type { ConsoleDatabase } from '../../models/ConsoleDatabase';
import type { Outbox } from '../mail/Outbox';

/** Days before its expiry on which a key's owner is reminded (ASVS 5.0, 6.4.5 asks for it in time). */
const REMINDERS = [14, 3] as const;

interface Expiring {
  readonly id: string;
  readonly name: string;
  readonly shown: string;
  readonly accountId: string;
  readonly email: string;
}

// A key that was rotated ends as its owner wished; it needs no reminder.
const DUE = `
UPDATE api_keys k SET reminded_days = $1 FROM accounts a
WHERE a.id = k.account_id AND a.closed_at IS NULL AND k.revoked_at IS NULL AND k.claimed_at IS NOT NULL
  AND k.replaced_by IS NULL AND k.expires_at > service_now()
  AND k.expires_at <= service_now() + make_interval(days => $1)
  AND k.created_at <= k.expires_at - make_interval(days => $1)
  AND (k.reminded_days IS NULL OR k.reminded_days > $1)
RETURNING k.id, k.name, k.shown_prefix || '…' || k.last_four AS shown, a.id AS "accountId", a.email`;

/** Mails the owners of keys that expire soon, once a reminder and key. Returns how many mails were put. */
export async function remindOfExpiry(
  database: ConsoleDatabase,
  outbox: Outbox,
  publicUrl: string,
): Promise<number> {
  const reminded = await database.transact(async (transaction) => {
    const seen = new Set<string>();
    // The nearest first, so that a key that comes late to both gets one mail.
    for (const days of [...REMINDERS].reverse()) {
      const due = await database.rows<Expiring>(DUE, [days], transaction);
      for (const { id, name, shown, accountId, email } of due) {
        const params = { name, shown, days, link: `${publicUrl}/keys/${id}` };
        await outbox.put({ accountId, to: email, kind: 'key_expires', params }, transaction);
        seen.add(id);
      }
    }
    return seen.size;
  });
  if (reminded > 0) outbox.nudge();
  return reminded;
}
