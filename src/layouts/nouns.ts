import type { Role } from '@/lib/orders/state';

export interface Noun {
  name: string;
  href: string;
}

/** Up to four nouns of the top line, by role. */
export const NOUNS: Record<Role, readonly Noun[]> = {
  customer: [
    { name: 'Orders', href: '/orders' },
    { name: 'New order', href: '/orders/new' },
  ],
  designer: [
    { name: 'Queue', href: '/queue' },
    { name: 'New order', href: '/orders/new' },
  ],
  operator: [
    { name: 'Today', href: '/today' },
    { name: 'Tickets', href: '/tickets' },
    { name: 'Outcomes', href: '/outcomes' },
    { name: 'New order', href: '/orders/new' },
  ],
  admin: [
    { name: 'Queue', href: '/queue' },
    { name: 'Today', href: '/today' },
    { name: 'Tickets', href: '/tickets' },
    { name: 'Outcomes', href: '/outcomes' },
  ],
};

/** What an admin finds below the account, beside the four. */
export const SHOP_NOUNS: readonly Noun[] = [
  { name: 'Machines', href: '/machines' },
  { name: 'Stocks', href: '/stocks' },
  { name: 'People', href: '/people' },
  { name: 'Record', href: '/record' },
];

/** Where "find" looks, by role: always a list with a search of its own. */
export const FIND_IN: Record<Role, string> = {
  customer: '/orders',
  designer: '/queue',
  operator: '/tickets',
  admin: '/queue',
};

/** The page a role starts from. */
export const HOME: Record<Role, string> = {
  customer: '/orders',
  designer: '/queue',
  operator: '/today',
  admin: '/queue',
};

/** Whether a noun's page, or one below it, is open; the longest match wins. */
export function isOpen(noun: Noun, nouns: readonly Noun[], path: string): boolean {
  const below = (href: string) => path === href || path.startsWith(`${href}/`);
  return (
    below(noun.href) && !nouns.some((other) => other.href.length > noun.href.length && below(other.href))
  );
}
