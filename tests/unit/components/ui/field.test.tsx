import { renderToStaticMarkup } from 'react-dom/server';
import { describe, expect, it } from 'vitest';
import { Field } from '@/components/ui/field';
import { Input } from '@/components/ui/input';
import { Notice } from '@/components/ui/notice';

const draw = (error: string | null) =>
  renderToStaticMarkup(
    <Field id="why" label="Reason" hint="Kept with the version." error={error}>
      {(control) => <Input {...control} />}
    </Field>,
  );

describe('a field', () => {
  it('ties its label and hint to the control', () => {
    const html = draw(null);
    expect(html).toContain('<label for="why"');
    expect(html).toContain('aria-describedby="why-hint"');
    expect(html).not.toContain('aria-invalid=');
  });

  it('reads the error out with the control', () => {
    const html = draw('Say why.');
    expect(html).toContain('aria-describedby="why-hint why-error"');
    expect(html).toContain('aria-invalid="true"');
    expect(html).toContain('Say why.');
  });
});

describe('a notice', () => {
  it('says its tone in words, not by colour alone', () => {
    const html = renderToStaticMarkup(<Notice tone="warn">Dusk is near.</Notice>);
    expect(html).toContain('Take care: ');
    expect(html).not.toContain('role=');
  });

  it('speaks at once when something failed', () => {
    expect(renderToStaticMarkup(<Notice live="assertive">Not stored.</Notice>)).toContain('role="alert"');
  });
});
