'use client';
import { formatCount } from '../../lib/units';
import { useBulk, useFormats, useLive } from '../live/EventContext';
import { useMay } from '../shell/Identified';
import page from '../ui/page.module.css';
import ui from '../ui/ui.module.css';
import { words } from '../words';
import { LayerInput } from './LayerInput';
import { useLayerList } from './useLayerList';

const text = words.layers;

/** What the wind is counted against, and how to bring more of it in. */
export function LayersPage() {
  const eventId = useLive((state) => state.eventId);
  const layers = useBulk((state) => state.layers);
  const { refresh } = useLayerList(eventId);
  const formats = useFormats();
  const may = useMay('admin');
  return (
    <div className={`${page.page} scroll`}>
      <h1>{text.title}</h1>
      {layers.length === 0 ? (
        <p className="dim">{text.none}</p>
      ) : (
        <table className={ui.table}>
          <caption>{text.caption}</caption>
          <thead>
            <tr>
              <th scope="col">{text.name}</th>
              <th scope="col">{text.kind}</th>
              <th scope="col" className="number">{text.rows}</th>
              <th scope="col">{text.classes}</th>
              <th scope="col" className="number">{text.version}</th>
              <th scope="col">{text.received}</th>
            </tr>
          </thead>
          <tbody>
            {layers.map((layer) => (
              <tr key={layer.id}>
                <th scope="row">
                  <strong>{layer.name}</strong>
                </th>
                <td>{text.kinds[layer.kind]}</td>
                <td className="number">{formatCount(layer.rows)}</td>
                <td className="dim">{layer.classes.map((one) => `${one.class} ${formatCount(one.count)}`).join(', ')}</td>
                <td className="number">{layer.version}</td>
                <td>
                  {formats.date(layer.receivedAt)} {formats.clock(layer.receivedAt)} <span className="dim">{layer.receivedBy}</span>
                </td>
              </tr>
            ))}
          </tbody>
        </table>
      )}
      {may ? <LayerInput eventId={eventId} onStored={refresh} /> : <p className="dim">{text.onlyAdmins}</p>}
    </div>
  );
}
