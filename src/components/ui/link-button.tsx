import type { ReactNode } from 'react';
import { Link } from 'react-router-dom';
import { Icon, type IconName } from '../icon';
import { buttonLook, type ButtonKind, type ButtonSize } from './button-look';

type LinkButtonProps = {
  to: string;
  children: ReactNode;
  kind?: ButtonKind;
  size?: ButtonSize;
  icon?: IconName;
  iconAfter?: IconName;
  className?: string;
};

/** Goes somewhere; looks like a button. */
export function LinkButton({
  to,
  children,
  kind = 'film',
  size = 'normal',
  icon,
  iconAfter,
  className = '',
}: LinkButtonProps) {
  return (
    <Link to={to} className={`${buttonLook(kind, size)} ${className}`}>
      {icon && <Icon name={icon} size={size === 'small' ? 18 : 20} />}
      {children}
      {iconAfter && <Icon name={iconAfter} size={18} />}
    </Link>
  );
}
