import { consoleApi, taken } from '../api/consoleApi';

export type { ApiKey, Session } from '../api/consoleApi';

type ChosenRole = 'developer' | 'photographer' | 'educator';

export interface SignUp {
  readonly email: string;
  readonly name: string;
  readonly password: string;
  readonly roles: ChosenRole[];
}

/** What people do with their accounts; each gives what the service answers, or throws why it did not. */
export const accountCalls = {
  signIn: (email: string, password: string) =>
    taken(consoleApi.POST('/api/session', { body: { email, password } })),
  signUp: (body: SignUp) => taken(consoleApi.POST('/api/sign-up', { body })),
  confirmSignUp: (token: string) => taken(consoleApi.POST('/api/sign-up/confirm', { body: { token } })),
  askForPassword: (email: string) => taken(consoleApi.POST('/api/password-reset', { body: { email } })),
  setPassword: (token: string, password: string) =>
    taken(consoleApi.POST('/api/password-reset/confirm', { body: { token, password } })),
  confirmEmail: (token: string) => taken(consoleApi.POST('/api/email-change/confirm', { body: { token } })),
  changeMe: (body: { name?: string; lengthUnit?: 'metres' | 'feet' }) =>
    taken(consoleApi.PATCH('/api/me', { body })),
  setRoles: (roles: ChosenRole[]) => taken(consoleApi.PUT('/api/me/roles', { body: { roles } })),
  changePassword: (currentPassword: string, newPassword: string) =>
    taken(consoleApi.POST('/api/me/password', { body: { currentPassword, newPassword } })),
  changeEmail: (email: string, password: string) =>
    taken(consoleApi.POST('/api/me/email', { body: { email, password } })),
  closeAccount: (password: string) => taken(consoleApi.POST('/api/me/close', { body: { password } })),
  exportData: () => taken(consoleApi.GET('/api/me/export')),
  events: (before: string | undefined, signal: AbortSignal) =>
    taken(consoleApi.GET('/api/me/events', { params: { query: { before } }, signal })),
  sessions: (signal: AbortSignal) => taken(consoleApi.GET('/api/sessions', { signal })),
  endSession: (id: string) => taken(consoleApi.DELETE('/api/sessions/{id}', { params: { path: { id } } })),
  endOtherSessions: () => taken(consoleApi.DELETE('/api/sessions')),
};
