import { cloneElement, type ReactElement, type ReactNode } from 'react';

interface LinkProps {
  href: string;
  asChild?: boolean;
  children: ReactNode;
  'aria-label'?: string;
}

/** Stands for the router's link: an anchor, or its child with the address. */
export function Link({ href, asChild, children, ...rest }: LinkProps) {
  if (asChild) return cloneElement(children as ReactElement<{ href: string }>, { href });
  return (
    <a href={href} aria-label={rest['aria-label']}>
      {children}
    </a>
  );
}

export function usePathname(): string {
  return '/';
}

export function Slot() {
  return null;
}

export function Navigator({ children }: { children: ReactNode }) {
  return children;
}
