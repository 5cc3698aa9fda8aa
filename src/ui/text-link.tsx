import { Link, type LinkProps } from 'react-router-dom';

export function TextLink({ className = '', ...rest }: LinkProps) {
  return (
    <Link {...rest} className={`underline decoration-edge underline-offset-4 hover:decoration-current ${className}`} />
  );
}
