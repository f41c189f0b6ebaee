import type { ConsoleDatabase, Transaction } from '../../models/ConsoleDatabase';
import type { Origin } from '../console/ConsoleServices';

export type AuditName =
  | 'signed_up'
  | 'signed_in'
  | 'sign_in_failed'
  | 'signed_out'
  | 'session_ended'
  | 'session_token_reused'
  | 'password_asked'
  | 'password_changed'
  | 'email_change_asked'
  | 'email_changed'
  | 'profile_changed'
  | 'roles_changed'
  | 'admin_granted'
  | 'key_made'
  | 'key_changed'
  | 'key_rotated'
  | 'key_revoked'
  | 'key_claimed'
  | 'pass_given'
  | 'plan_asked'
  | 'plan_wish_withdrawn'
  | 'data_exported'
  | 'account_closed';

export interface AuditEntry {
  readonly event: AuditName;
  readonly actorId?: string | null;
  readonly accountId?: string | null;
  readonly subject?: { readonly kind: 'key' | 'session'; readonly id: string };
  /** What changed, before and after; never a secret. */
  readonly details?: Record<string, unknown>;
}

/** Notes an act of consequence, in the transaction that it belongs to. */
export async function audit(
  database: ConsoleDatabase,
  origin: Origin | null,
  { event, accountId = null, actorId = accountId, subject, details = {} }: AuditEntry,
  transaction?: Transaction,
): Promise<void> {
  await database.rows(
    `INSERT INTO audit_events (event, actor_id, account_id, subject_kind, subject_id, details, address, agent, request_id)
     VALUES ($1, $2, $3, $4, $5, $6, $7, $8, $9)`,
    [
      event,
      actorId,
      accountId,
      subject?.kind ?? null,
      subject?.id ?? null,
      JSON.stringify(details),
      origin?.address ?? null,
      origin?.agent ?? null,
      origin?.requestId ?? null,
    ],
    transaction,
  );
}
