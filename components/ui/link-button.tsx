import type { ComponentPropsWithoutRef, ReactElement } from 'react';
import { buttonLook, type ButtonSize, type ButtonTone } from './button-look';

interface LinkButtonProps extends ComponentPropsWithoutRef<'a'> {
  href: string;
  tone?: ButtonTone;
  size?: ButtonSize;
}

/** A link that looks like a button: for going somewhere or fetching a file. A full document load. */
export function LinkButton({ tone = 'plain', size = 'lab', className, ...rest }: LinkButtonProps): ReactElement {
  return <a className={buttonLook(tone, size, className)} {...rest} />;
}
