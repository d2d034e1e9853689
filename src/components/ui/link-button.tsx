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
  /** A file of the server, such as a sheet of labels: opened by the browser in a tab of its own. */
  isFile?: boolean;
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
  isFile = false,
  className = '',
}: LinkButtonProps) {
  const look = `${buttonLook(kind, size)} ${className}`;
  const inside = (
    <>
      {icon && <Icon name={icon} size={size === 'small' ? 18 : 20} />}
      {children}
      {iconAfter && <Icon name={iconAfter} size={18} />}
    </>
  );
  return isFile ? (
    <a href={to} target="_blank" rel="noopener" className={look}>
      {inside}
    </a>
  ) : (
    <Link to={to} className={look}>
      {inside}
    </Link>
  );
}
