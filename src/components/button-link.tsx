import { Link, type LinkProps } from 'react-router-dom';
import { buttonStyle, type ButtonSize, type ButtonVariant } from './button-style.ts';
import { classNames } from './class-names.ts';
import { Icon, type IconName } from './icon.tsx';

interface ButtonLinkProps extends LinkProps {
  variant?: ButtonVariant;
  size?: ButtonSize;
  icon?: IconName;
}

/** Goes to another page but stands where a button would. */
export function ButtonLink({
  variant = 'plain',
  size = 'normal',
  icon,
  className,
  children,
  ...rest
}: ButtonLinkProps) {
  return (
    <Link {...rest} className={classNames(buttonStyle(variant, size), className)}>
      {icon && <Icon name={icon} />}
      {children}
    </Link>
  );
}
