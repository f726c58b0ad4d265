'use client';
import { useEffect, useState } from 'react';
import { useHold, useLive } from '../live/EventContext';
import { useMay } from '../shell/Identified';
import { words } from '../words';
import page from '../ui/page.module.css';
import { AdvisoryByHand } from './AdvisoryByHand';
import { History } from './History';
import { Reading } from './Reading';
import { SourceInput } from './SourceInput';
import { useReading } from './useReading';

/** Give a forecast, see what was read and what is wrong with it, issue it; and what was issued before. */
export function ForecastsPage() {
  const { view } = useHold();
  const eventId = useLive((state) => state.eventId);
  const [byHand, setByHand] = useState(false);
  const reading = useReading(eventId);
  const may = useMay('operator');
  const preview = reading.state.kind === 'read' ? reading.state.result.advisory : null;
  useEffect(() => {
    view.setState({ preview });
    return () => view.setState({ preview: null });
  }, [view, preview]);
  return (
    <div className={`${page.page} scroll`}>
      <h1>{words.forecasts.title}</h1>
      {!may && <p className="dim">{words.forecasts.onlyOperators}</p>}
      {!may ? null : byHand ? <AdvisoryByHand reading={reading} onBack={() => setByHand(false)} /> : <SourceInput onSource={reading.read} onByHand={() => setByHand(true)} busy={reading.state.kind === 'reading'} />}
      <Reading reading={reading} byHand={byHand} mayIssue={may} />
      <History eventId={eventId} />
    </div>
  );
}
