import type { ComponentProps, ReactElement } from 'react';
import { Button } from '@/components/ui/button';
import { LinkButton } from '@/components/ui/link-button';

/** Thick edges and round corners of everything one presses in the field. */
const LOOK = 'rounded-xl border-3 touch-manipulation print:hidden';

type FieldButtonProps = Omit<ComponentProps<typeof Button>, 'size'>;
type FieldLinkProps = Omit<ComponentProps<typeof LinkButton>, 'size'>;

/** A button for a gloved finger. Acts on release inside it, so that one can slide off and let go. */
export function FieldButton({ className = '', ...rest }: FieldButtonProps): ReactElement {
  return <Button size="field" className={`${LOOK} ${className}`} {...rest} />;
}

/** A link that looks like such a button. */
export function FieldLink({ className = '', ...rest }: FieldLinkProps): ReactElement {
  return <LinkButton size="field" className={`${LOOK} ${className}`} {...rest} />;
}
