import { Button } from '../ui/Button';
import { words } from '../words';
import styles from './Map.module.css';

export function MapButtons({ onZoom, onFit }: { onZoom: (by: number) => void; onFit: () => void }) {
  return (
    <div className={styles.buttons}>
      <Button onPress={() => onZoom(1)} aria-label={words.map.zoomIn}>
        +
      </Button>
      <Button onPress={() => onZoom(-1)} aria-label={words.map.zoomOut}>
        −
      </Button>
      <Button onPress={onFit}>{words.map.fit}</Button>
    </div>
  );
}
