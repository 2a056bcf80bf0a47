import { Button as AriaButton, type ButtonProps } from 'react-aria-components/Button';

interface Props extends Omit<ButtonProps, 'className' | 'style'> {
  /** one filled button a page; `stop` for what cannot be taken back */
  kind?: 'filled' | 'outlined' | 'text' | 'stop';
  wide?: boolean;
}

export function Button({ kind = 'outlined', wide = false, ...props }: Props) {
  return <AriaButton {...props} data-kind={kind} className={wide ? 'button w-full' : 'button'} />;
}
