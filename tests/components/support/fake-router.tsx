import { cloneElement, type ReactElement } from 'react';

/** Where the screens wanted to go, newest last. */
export const visited: unknown[] = [];

const go = (to: unknown) => void visited.push(to);
const router = { push: go, replace: go, navigate: go };

export const useRouter = () => router;
export const usePathname = () => '/';

/** "/journal/[entryId]" with its parameter becomes the address it stands for. */
function addressOf(href: unknown): string {
  if (typeof href === 'string') return href;
  const { pathname, params } = href as { pathname: string; params: Record<string, string> }; // the other form of an Href
  const query = new URLSearchParams(params);
  const path = pathname.replace(/\[(\w+)\]/g, (_, name: string) => {
    query.delete(name);
    return params[name] ?? '';
  });
  return query.toString() === '' ? path : `${path}?${query.toString()}`;
}

interface LinkProps {
  readonly href: unknown;
  readonly asChild?: boolean;
  readonly children: ReactElement<{ href?: string }>;
}

/** A plain link of the page. */
export function Link({ href, asChild, children }: LinkProps) {
  const address = addressOf(href);
  return asChild ? cloneElement(children, { href: address }) : <a href={address}>{children}</a>;
}
