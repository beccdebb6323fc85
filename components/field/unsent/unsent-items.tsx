'use client';

import type { ReactElement } from 'react';
import { momentWords } from '@/components/ui/date-words';
import { usePerson } from '@/components/field/parts/person-context';
import { troubleWords } from '@/components/field/words/trouble-words';
import type { OutboxItem } from '@/lib/offline/hooks/use-outbox';

function Item({ item, zone }: { item: OutboxItem; zone: string }): ReactElement {
  const { what, todo } = troubleWords(item.why, item.code);
  return (
    <li className="border-b border-rule py-2">
      <p className="font-bold [overflow-wrap:anywhere]">{item.words}</p>
      <p className="text-quiet">
        {item.nest && `${item.nest} · `}
        {momentWords(item.savedAt, zone)}
      </p>
      {item.why !== 'waiting' && (
        <p>
          {what} <strong>{todo}</strong>
        </p>
      )}
    </li>
  );
}

/** Items in plain words; those that are held up say why and what to do. */
export function UnsentItems({ items }: { items: readonly OutboxItem[] }): ReactElement {
  const { zone } = usePerson();
  return (
    <ul>
      {items.map((item) => (
        <Item key={item.opId} item={item} zone={zone} />
      ))}
    </ul>
  );
}
