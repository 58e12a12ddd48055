import type { ButtonHTMLAttributes, ReactNode } from 'react';
import { Link, type LinkProps } from 'react-router';
import { Icon, type IconName } from '../icon.tsx';

type Kind = 'primary' | 'plain' | 'text' | 'grave' | 'grave-filled';
type Size = 'normal' | 'tall' | 'big';

interface Look {
  /** One primary in a view; grave-filled only in the dialog that asks. */
  kind?: Kind;
  /** 44, 56 or 64 px high. */
  size?: Size;
  wide?: boolean;
  icon?: IconName;
  children: ReactNode;
}

function classes({ kind = 'plain', size = 'normal', wide }: Look, extra = ''): string {
  return [
    'btn',
    kind !== 'plain' && `btn-${kind}`,
    size !== 'normal' && `btn-${size}`,
    wide && 'w-full',
    extra,
  ]
    .filter(Boolean)
    .join(' ');
}

/** A button. A disabled one always has its reason in words next to it. */
export function Button({
  kind,
  size,
  wide,
  icon,
  children,
  className,
  ...rest
}: Look & ButtonHTMLAttributes<HTMLButtonElement>) {
  return (
    <button type="submit" className={classes({ kind, size, wide, children }, className)} {...rest}>
      {icon && <Icon name={icon} size={size === 'big' ? 24 : 20} />}
      {children}
    </button>
  );
}

/** A link that looks like a button. */
export function ButtonLink({
  kind,
  size,
  wide,
  icon,
  children,
  className,
  ...rest
}: Look & Omit<LinkProps, 'children'>) {
  return (
    <Link className={classes({ kind, size, wide, children }, className)} {...rest}>
      {icon && <Icon name={icon} size={size === 'big' ? 24 : 20} />}
      {children}
    </Link>
  );
}
