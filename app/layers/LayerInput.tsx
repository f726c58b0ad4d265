'use client';
import { useState } from 'react';
import { DropZone } from 'react-aria-components/DropZone';
import { FileTrigger } from 'react-aria-components/FileTrigger';
import { Text } from 'react-aria-components/Text';
import type { InputError } from '../../lib/advisory';
import { LAYER_KINDS } from '../../lib/exposure';
import type { LayerKind } from '../../lib/exposure';
import { formatCount } from '../../lib/units';
import { MOST_LAYER_BYTES } from '../../lib/wire';
import { megabytes } from '../forecasts/source';
import { RequestFailed } from '../http/problem';
import { Button } from '../ui/Button';
import { Choice } from '../ui/Choice';
import { Field } from '../ui/Field';
import { Notice } from '../ui/Notice';
import ui from '../ui/ui.module.css';
import { words } from '../words';
import { RowErrors } from './RowErrors';
import { sendLayer } from './sendLayer';
import type { LayerStored } from './sendLayer';

const text = words.layers;

type Outcome = { kind: 'none' } | { kind: 'sending' } | { kind: 'stored'; stored: LayerStored } | { kind: 'failed'; message: string; errors: readonly InputError[] };

/** A layer brought in from a file, with its kind and name. */
export function LayerInput({ eventId, onStored }: { eventId: string; onStored: () => void }) {
  const [file, setFile] = useState<File | null>(null);
  const [kind, setKind] = useState<LayerKind>('assets');
  const [name, setName] = useState('');
  const [outcome, setOutcome] = useState<Outcome>({ kind: 'none' });
  const take = (given: File | undefined): void => {
    if (!given) return;
    setFile(given);
    setOutcome({ kind: 'none' });
    if (name === '') setName(given.name.replace(/\.[^.]+$/, ''));
  };
  const send = async (given: File): Promise<void> => {
    if (given.size > MOST_LAYER_BYTES) return setOutcome({ kind: 'failed', message: words.forecasts.tooBig(megabytes(given.size), megabytes(MOST_LAYER_BYTES)), errors: [] });
    setOutcome({ kind: 'sending' });
    try {
      setOutcome({ kind: 'stored', stored: await sendLayer(eventId, kind, name.trim(), given) });
      setFile(null);
      setName('');
      onStored();
    } catch (error) {
      setOutcome({ kind: 'failed', message: error instanceof Error ? error.message : words.common.unreachable, errors: error instanceof RequestFailed ? error.errors : [] });
    }
  };
  return (
    <section className={ui.stack}>
      <h2>{text.add}</h2>
      <DropZone
        className={ui.drop}
        onDrop={(event) => {
          const item = event.items.find((one) => one.kind === 'file');
          if (item?.kind === 'file') void item.getFile().then(take);
        }}
      >
        <Text slot="label">{file ? `${file.name}, ${megabytes(file.size)}` : text.drop}</Text>
        <FileTrigger onSelect={(files) => take(files?.[0])}>
          <Button>{text.choose}</Button>
        </FileTrigger>
        <p className="dim small">{text.hint}</p>
      </DropZone>
      <div className={ui.row}>
        <Choice label={text.kind} value={kind} onChange={setKind} options={LAYER_KINDS.map((value) => ({ value, text: text.kinds[value] }))} />
        <Field label={text.name} value={name} onChange={setName} name="layerName" />
        <Button strong isDisabled={!file || name.trim() === '' || outcome.kind === 'sending'} onPress={() => file && void send(file)}>
          {outcome.kind === 'sending' ? text.sending : text.send}
        </Button>
      </div>
      {outcome.kind === 'stored' && (
        <Notice tone={outcome.stored.rejected.length > 0 ? 'warning' : 'plain'} title={text.stored(outcome.stored.layer.name, formatCount(outcome.stored.accepted))}>
          {outcome.stored.rejected.length > 0 && (
            <>
              <p>{text.rejected(formatCount(outcome.stored.rejected.length))}</p>
              <RowErrors rows={outcome.stored.rejected} />
            </>
          )}
        </Notice>
      )}
      {outcome.kind === 'failed' && (
        <Notice tone="error" title={text.failed}>
          <p>{outcome.message}</p>
          {outcome.errors.length > 0 && <RowErrors rows={outcome.errors.map((error) => ({ row: error.line ?? null, column: error.path, message: error.message }))} />}
        </Notice>
      )}
    </section>
  );
}
