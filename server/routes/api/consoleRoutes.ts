import { changeEmailRoute, changePasswordRoute, closeAccountRoute, confirmEmailRoute } from './credentials';
import { exportRoute } from './exportData';
import { claimKeyRoute, passRoute, revokeKeyRoute, rotateKeyRoute } from './keyLife';
import { changeKeyRoute, keyRoute, keysRoute, makeKeyRoute } from './keys';
import { keepKitRoute, kitRoute } from './kit';
import { changeMeRoute, eventsRoute, meRoute, rolesRoute } from './me';
import { askForPasswordRoute, setPasswordRoute } from './passwordReset';
import type { Route } from './route';
import {
  changeSavedRoute,
  dropSavedRoute,
  savedListRoute,
  savedRoute,
  saveRoute,
  sharedRoute,
  shareRoute,
  unshareRoute,
} from './saved';
import { askForPlanRoute, planRoute, withdrawPlanRequestRoute } from './plan';
import { refreshRoute, sessionStateRoute, signInRoute, signOutRoute } from './session';
import { endOtherSessionsRoute, endSessionRoute, sessionsRoute } from './sessions';
import { confirmSignUpRoute, signUpRoute } from './signUp';
import { keyLogRoute, usageRoute } from './usage';

/** Every address of the console's API. */
export const consoleRoutes: readonly Route[] = [
  signUpRoute,
  confirmSignUpRoute,
  sessionStateRoute,
  signInRoute,
  signOutRoute,
  refreshRoute,
  askForPasswordRoute,
  setPasswordRoute,
  meRoute,
  changeMeRoute,
  rolesRoute,
  changePasswordRoute,
  changeEmailRoute,
  confirmEmailRoute,
  exportRoute,
  eventsRoute,
  closeAccountRoute,
  sessionsRoute,
  endSessionRoute,
  endOtherSessionsRoute,
  keysRoute,
  makeKeyRoute,
  keyRoute,
  changeKeyRoute,
  rotateKeyRoute,
  revokeKeyRoute,
  claimKeyRoute,
  passRoute,
  keyLogRoute,
  usageRoute,
  planRoute,
  askForPlanRoute,
  withdrawPlanRequestRoute,
  kitRoute,
  keepKitRoute,
  savedListRoute,
  saveRoute,
  savedRoute,
  changeSavedRoute,
  dropSavedRoute,
  shareRoute,
  unshareRoute,
  sharedRoute,
];
