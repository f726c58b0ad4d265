'use client';
import { useState } from 'react';
import { DropZone } from 'react-aria-components/DropZone';
import { FileTrigger } from 'react-aria-components/FileTrigger';
import { Text } from 'react-aria-components/Text';
import { decodeText } from '../../lib/advisory';
import { MOST_ADVISORY_BYTES } from '../../lib/wire';
import { Button } from '../ui/Button';
import { Field } from '../ui/Field';
import ui from '../ui/ui.module.css';
import { words } from '../words';
import type { Source } from './source';

const text = words.forecasts;

/** The file as a source; its text is kept beside it to quote lines from. */
async function fromFile(file: File): Promise<Source> {
  const decoded = file.size > MOST_ADVISORY_BYTES ? null : decodeText(new Uint8Array(await file.arrayBuffer()));
  return { name: file.name, body: file, contentType: 'text/plain', text: decoded?.ok ? decoded.text : null };
}

/** Drop, choose or paste a forecast. */
export function SourceInput({ onSource, onByHand, busy }: { onSource: (source: Source) => void; onByHand: () => void; busy: boolean }) {
  const [pasting, setPasting] = useState(false);
  const [typed, setTyped] = useState('');
  const take = (file: File | undefined): void => {
    if (file) void fromFile(file).then(onSource);
  };
  return (
    <>
      <DropZone
        className={ui.drop}
        isDisabled={busy}
        onDrop={(event) => {
          const item = event.items.find((one) => one.kind === 'file');
          if (item?.kind === 'file') void item.getFile().then(take);
        }}
      >
        <Text slot="label">{text.drop}</Text>
        <div className={ui.dropActions}>
          <FileTrigger onSelect={(files) => take(files?.[0])}>
            <Button isDisabled={busy}>{text.choose}</Button>
          </FileTrigger>
          <Button onPress={() => setPasting(!pasting)} aria-expanded={pasting}>
            {text.paste}
          </Button>
          <Button onPress={onByHand}>{text.type}</Button>
        </div>
      </DropZone>
      {pasting && (
        <form
          className={ui.stack}
          onSubmit={(event) => {
            event.preventDefault();
            onSource({ name: 'pasted.txt', body: typed, contentType: 'text/plain', text: typed });
          }}
        >
          <Field label={text.pasteLabel} value={typed} onChange={setTyped} lines={12} mono />
          <Button type="submit" isDisabled={busy || typed.trim() === ''}>
            {text.read}
          </Button>
        </form>
      )}
    </>
  );
}
