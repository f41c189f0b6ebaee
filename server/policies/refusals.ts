import { secondsToReset, secondsToToken } from '../presenters/limitHeaders';
import { ProblemError } from '../http/ProblemError';
import type { Ask, Decision, Standing } from '../services/metering/meter';

const bearer = (error?: string) => ({
  'WWW-Authenticate': `Bearer realm="evenfall"${error ? `, error="${error}"` : ''}`,
});

/** No key, or none that could be one. */
export function keyMissing(): ProblemError {
  return new ProblemError('key_missing', undefined, { headers: bearer() });
}

/** A key whose checksum does not fit: a typing error. */
export function keyMistyped(): ProblemError {
  const detail =
    'The key has a typing error: its checksum does not fit. Copy it again, whole, from "evenfall_" to its last character.';
  return new ProblemError('key_invalid', detail, { headers: bearer('invalid_token') });
}

/** A pass is for the console's own pages. */
export function passElsewhere(): ProblemError {
  const detail = 'A pass works from the console’s own pages only. Programs send a server key.';
  return new ProblemError('origin_not_allowed', detail);
}

/** A pass that ended is not known any more. */
function passEnded(): ProblemError {
  const detail = 'A pass works for ten minutes and as long as its session; the console asks for a new one.';
  return new ProblemError('key_expired', detail, { headers: bearer('invalid_token') });
}

function overQuota(ask: Ask, { limit, used }: Standing): string {
  const left = Math.max(0, limit - used);
  return `The call costs ${ask.units} ${ask.units === 1 ? 'unit' : 'units'}; ${left} of this month's ${limit} are left.`;
}

function overCap(ask: Ask, { cap, keyUsed }: Standing): string {
  const left = Math.max(0, (cap ?? 0) - keyUsed);
  return `The call costs ${ask.units} ${ask.units === 1 ? 'unit' : 'units'}; ${left} of the key's own ${cap ?? 0} a month are left.`;
}

function limited(code: 'rate_limited' | 'quota_exhausted' | 'key_cap_reached', ask: Ask, standing: Standing) {
  const wait = code === 'rate_limited' ? secondsToToken(standing) : secondsToReset(standing.at);
  const details = {
    rate_limited: `The account may make ${standing.ratePerSecond} calls a second, ${standing.burst} at once; wait ${wait} s.`,
    quota_exhausted: overQuota(ask, standing),
    key_cap_reached: overCap(ask, standing),
  };
  return new ProblemError(code, details[code], { headers: { 'Retry-After': String(wait) } });
}

/** A meter's refusal as people and programs read it. */
export function refusalProblem(decision: Extract<Decision, { granted: false }>, ask: Ask): ProblemError {
  const { refusal, standing } = decision;
  switch (refusal) {
    case 'rate_limited':
    case 'quota_exhausted':
    case 'key_cap_reached':
      return standing ? limited(refusal, ask, standing) : new ProblemError(refusal);
    case 'scope_missing': {
      const scope = ask.needs.map((need) => need.split('/')[0]).join(' ');
      const challenge = `Bearer realm="evenfall", error="insufficient_scope", scope="${scope}"`;
      const detail = `This key does not hold the scope that ${ask.needs.join(', ')} needs.`;
      return new ProblemError(refusal, detail, { headers: { 'WWW-Authenticate': challenge } });
    }
    case 'origin_not_allowed': {
      const detail = ask.site
        ? `${ask.site} is not on the widget's list of sites.`
        : 'A page key works only from a page on its widget’s list; this call named no site.';
      return new ProblemError(refusal, detail);
    }
    case 'account_blocked':
      return new ProblemError(refusal);
    case 'key_invalid': {
      if (ask.isPass) return passEnded();
      const detail = 'The key is well formed, but there is no such key. Make one in the console under Keys.';
      return new ProblemError(refusal, detail, { headers: bearer('invalid_token') });
    }
    default:
      return new ProblemError(refusal, undefined, { headers: bearer('invalid_token') });
  }
}
