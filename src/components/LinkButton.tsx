import type { AnchorHTMLAttributes } from 'react';

interface Props extends AnchorHTMLAttributes<HTMLAnchorElement> {
  kind?: 'filled' | 'outlined' | 'text';
}

/** A link with a button's weight; also from .astro pages, without an island. */
export function LinkButton({ kind = 'outlined', className = '', ...props }: Props) {
  return <a {...props} data-kind={kind} className={`button ${className}`} />;
}
