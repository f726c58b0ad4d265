'use client';
import { useState } from 'react';
import { Button } from '../ui/Button';
import { Choice } from '../ui/Choice';
import { Field } from '../ui/Field';
import ui from '../ui/ui.module.css';
import { words } from '../words';
import { emptyForm, errorsByCell, toBody } from './advisoryForm';
import type { AdvisoryForm } from './advisoryForm';
import styles from './Forecasts.module.css';
import { Placed } from './Placed';
import { PointsEditor } from './PointsEditor';
import type { ReadingControl } from './useReading';

const text = words.forecasts.form;

/** An advisory typed in: the same check as a file, errors beside the cells they stand in. */
export function AdvisoryByHand({ reading, onBack }: { reading: ReadingControl; onBack: () => void }) {
  const [form, setForm] = useState<AdvisoryForm>(emptyForm);
  const errors = errorsByCell(reading.state.kind === 'wrong' ? reading.state.errors : [], form);
  const set = (part: Partial<AdvisoryForm>): void => setForm({ ...form, ...part });
  const check = (): void => reading.read({ name: 'form.json', body: JSON.stringify(toBody(form), null, 2), contentType: 'application/json', text: null });
  return (
    <form
      className={ui.stack}
      aria-label={text.title}
      onSubmit={(event) => {
        event.preventDefault();
        check();
      }}
    >
      <h2>{text.title}</h2>
      <div className={styles.fields}>
        <Field label={text.storm} value={form.stormName} onChange={(stormName) => set({ stormName })} error={errors.fields.get('stormName')} name="storm" />
        <Field label={text.stormId} value={form.stormId} onChange={(stormId) => set({ stormId })} error={errors.fields.get('stormId')} name="stormId" />
        <Field label={text.number} value={form.number} onChange={(number) => set({ number })} error={errors.fields.get('number')} name="number" />
        <Field label={text.centre} value={form.centre} onChange={(centre) => set({ centre })} error={errors.fields.get('centre')} name="centre" />
        <Field label={text.issuedAt} value={form.issuedAt} onChange={(issuedAt) => set({ issuedAt })} error={errors.fields.get('issuedAt')} placeholder="2031-09-19 09:00" name="issuedAt" />
        <Field label={text.nextDueAt} value={form.nextDueAt} onChange={(nextDueAt) => set({ nextDueAt })} error={errors.fields.get('nextDueAt')} placeholder="2031-09-19 15:00" name="nextDueAt" />
        <Choice label={text.averaging} value={form.averaging} onChange={(averaging) => set({ averaging })} options={[{ value: '1-min', text: '1-min' }, { value: '10-min', text: '10-min' }]} />
      </div>
      <h3>{text.points}</h3>
      <p className="dim small">
        {text.pointsHint} {text.radiiHint}
      </p>
      <PointsEditor rows={form.rows} errors={errors.cells} onChange={(rows) => set({ rows })} />
      <Placed items={errors.rest} source={null} label={words.forecasts.errors} />
      <div className={ui.dropActions}>
        <Button type="submit" strong={reading.state.kind !== 'read'} isDisabled={reading.state.kind === 'reading'}>
          {text.check}
        </Button>
        <Button onPress={onBack}>{text.back}</Button>
      </div>
    </form>
  );
}
