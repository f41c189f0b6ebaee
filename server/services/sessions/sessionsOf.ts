import { literal, Op } from 'sequelize';
import { IDLE_HOURS } from '../../policies/sessionLife';
import type { ConsoleDatabase } from '../../models/ConsoleDatabase';
import type { Session } from '../../models/Session';

/** The live sessions of an account, the one that was used last first. */
export function sessionsOf({ sessions }: ConsoleDatabase, accountId: string): Promise<Session[]> {
  return sessions.findAll({
    where: {
      accountId,
      endedAt: null,
      expiresAt: { [Op.gt]: literal('service_now()') },
      lastSeenAt: { [Op.gt]: literal(`service_now() - make_interval(hours => ${IDLE_HOURS})`) },
    },
    order: [
      ['lastSeenAt', 'DESC'],
      ['id', 'ASC'],
    ],
  });
}
