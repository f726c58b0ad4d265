import { EventPicker } from './picker/EventPicker';
import { Identified } from './shell/Identified';

export default function HomePage() {
  return (
    <Identified>
      <EventPicker />
    </Identified>
  );
}
