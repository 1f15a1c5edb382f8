import type { ReactNode } from 'react';
import { useQueryClient } from '@tanstack/react-query';
import { sessionQuery, useSession } from '@/components/api/session';
import { ButtonLink } from '@/components/ui/button';
import { EmptyState, ErrorState, Loading } from '@/components/ui/states';
import type { OwnPerson } from '@/shared/api/account';
import { includesRole, type Role } from '@/shared/standing';

type SignedInOnlyProps = {
  /** Path of this page, to come back to after signing in. */
  page: string;
  /** The least role that may see it. */
  needs?: Role;
  children: (person: OwnPerson) => ReactNode;
};

/** Shows its children to whoever may see them, and the others why not. The server decides; this only spares the way. */
export function SignedInOnly({ page, needs = 'technician', children }: SignedInOnlyProps) {
  const { state, person, standing } = useSession();
  const queryClient = useQueryClient();
  if (state === 'unknown') return <Loading label="Asking who you are" />;
  if (state === 'unreachable') {
    return (
      <ErrorState
        title="The server cannot be reached."
        onRetry={() => void queryClient.refetchQueries({ queryKey: sessionQuery.queryKey })}
      >
        Your account is on the server. The look-up works meanwhile.
      </ErrorState>
    );
  }
  if (person === null) {
    return (
      <EmptyState
        title="Sign in to see this page."
        action={
          <>
            <ButtonLink href={{ pathname: '/sign-in', params: { next: page } }} kind="primary" label="Sign in" />
            <ButtonLink href="/sign-up" label="Make an account" />
          </>
        }
      />
    );
  }
  if (!includesRole(standing, needs)) {
    return (
      <EmptyState
        title={`This page is for ${needs}s.`}
      >{`You are signed in as ${person.name}, ${person.role}.`}</EmptyState>
    );
  }
  return <>{children(person)}</>;
}
