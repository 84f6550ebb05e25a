import { usePathname, type Href } from 'expo-router';
import type { ReactNode } from 'react';
import { useAccount } from '../queries/account';
import { NoPermission } from '../ui/Message';
import { Skeleton } from '../ui/Skeleton';
import { Screen } from './Screen';

interface RoleGateProps {
  /** Title of the page while it may not be shown. */
  title: string;
  /** Any of these roles opens it; none given: every signed-in person. */
  roles?: readonly string[];
  children: ReactNode;
}

/** Shows a page to those who may see it; others read who may, and how to get there. */
export function RoleGate({ title, roles, children }: RoleGateProps) {
  const account = useAccount();
  const path = usePathname();
  if (account.status === 'in' && (roles === undefined || roles.some((role) => account.roles.some((own) => own === role)))) return children;
  return (
    <Screen title={title}>
      {account.status === 'loading' ? <Skeleton /> : null}
      {account.status === 'out' ? (
        <NoPermission title="This page needs an account." text={roles ? `It is for ${roles.join(', ')}.` : 'It shows what is yours.'} action={{ label: 'Sign in', href: `/sign-in?next=${encodeURIComponent(path)}` as Href }} />
      ) : null}
      {account.status === 'in' ? (
        <NoPermission title={`This page is for ${(roles ?? []).join(' or ')}.`} text="Roles are given by an administrator of the register." action={{ label: 'To the register', href: '/' }} />
      ) : null}
    </Screen>
  );
}
