import type { ComponentPropsWithRef, ReactElement } from 'react';
import { buttonLook, type ButtonSize, type ButtonTone } from './button-look';

interface ButtonProps extends ComponentPropsWithRef<'button'> {
  tone?: ButtonTone;
  size?: ButtonSize;
}

/** A button that names its act. Does not submit a form unless told to. */
export function Button({
  tone = 'plain',
  size = 'lab',
  type = 'button',
  className,
  ...rest
}: ButtonProps): ReactElement {
  return <button type={type} className={buttonLook(tone, size, className)} {...rest} />;
}
