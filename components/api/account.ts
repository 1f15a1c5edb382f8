import { useMutation, useQueryClient, type QueryClient } from '@tanstack/react-query';
import type {
  AddressRequest,
  ConfirmRequest,
  PasswordChange,
  ResetRequest,
  SessionAnswer,
  SignInRequest,
  SignUpRequest,
} from '@/shared/api/account';
import type { RoleRequestInput, RoleRequestRow } from '@/shared/api/people';
import { request } from './client';
import { rememberSignedIn, sessionQuery } from './session';

/** Makes an account; the answer is the same for every address. */
export const signUp = (body: SignUpRequest) => request<void>('/accounts', { method: 'POST', body });

/** Confirms an address with the token of the link. */
export const confirmAddress = (body: ConfirmRequest) => request<void>('/accounts/confirm', { method: 'POST', body });

/** Asks for another link to confirm an address. */
export const resendConfirmation = (body: AddressRequest) =>
  request<void>('/accounts/resend-confirmation', { method: 'POST', body });

/** Asks for a link to choose a new password. */
export const askPasswordReset = (body: AddressRequest) => request<void>('/password-resets', { method: 'POST', body });

/** Chooses a new password with the token of the link. */
export const resetPassword = (body: ResetRequest) =>
  request<void>('/password-resets/complete', { method: 'POST', body });

/** Changes the password of the person who is signed in. */
export const changePassword = (body: PasswordChange) => request<void>('/me/password', { method: 'PUT', body });

/** Asks for the role of contributor. */
export const askToContribute = (body: RoleRequestInput) =>
  request<RoleRequestRow>('/role-requests', { method: 'POST', body });

/** Signs in; the session is in cookies that the page cannot read. */
export const signIn = (body: SignInRequest) => request<SessionAnswer>('/sessions', { method: 'POST', body });

const isNotSession = ({ queryKey }: { queryKey: readonly unknown[] }) => queryKey[0] !== sessionQuery.queryKey[0];

/** Takes over the answer of a sign-in: the person is known at once, and what a guest was shown is asked again. */
export function acceptSession(queryClient: QueryClient, { person }: SessionAnswer): void {
  rememberSignedIn(true);
  queryClient.setQueryData(sessionQuery.queryKey, person);
  void queryClient.invalidateQueries({ predicate: isNotSession });
}

/** Signs out here. What only this person may see is forgotten at once. */
export function useSignOut() {
  const queryClient = useQueryClient();
  return useMutation({
    mutationFn: () => request<void>('/sessions/current', { method: 'DELETE' }),
    onSuccess: () => {
      rememberSignedIn(false);
      // Not clear(): a page that shows the session would go on showing the query that was thrown away.
      queryClient.setQueryData(sessionQuery.queryKey, null);
      queryClient.removeQueries({ predicate: isNotSession });
    },
  });
}
