import type { Ref } from '../layout/ref';
import type { Layout, Scheme } from '../layout/schema';
import { seatsOf } from '../layout/seating';
import { useLayout, useScheme, useSession } from '../session/session';
import { BlockPanel } from './BlockPanel';
import { FacePanel } from './FacePanel';
import { ItemProblems } from './Fields';
import { FinishPanel } from './FinishPanel';
import { keyOf } from './item-list';
import { LoudspeakerPanel } from './LoudspeakerPanel';
import { MicrophonePanel } from './MicrophonePanel';
import { placeOf, problemsAt } from './problems-of';
import { RoutingPanel, SchemePanel } from './SchemePanels';
import { SeatListPanel } from './SeatListPanel';
import { SeatPanel } from './SeatPanel';
import { SystemPanel } from './SystemPanel';
import { TalkerPanel } from './TalkerPanel';
import { VenuePanel } from './VenuePanel';
import { ViewPanel } from './ViewPanel';

/** Whatever is selected, with numbers to type; the venue where nothing is, or where what was selected is gone. */
export function ItemDetail() {
  const layout = useLayout();
  const scheme = useScheme();
  const selection = useSession((session) => session.selection);
  const problems = useSession((session) => session.problems);
  const panel = selection === null ? null : (panelOf(layout, scheme, selection) ?? null);
  const place = panel === null || selection === null ? null : placeOf(layout, scheme.id, selection);
  return (
    // Another thing has fields of its own: what was half typed for this one must not show there.
    <div className="it" key={panel === null || selection === null ? 'venue' : keyOf(selection)}>
      <ItemProblems value={place === null ? [] : problemsAt(problems, place)}>{panel ?? <VenuePanel />}</ItemProblems>
    </div>
  );
}

function panelOf(layout: Layout, scheme: Scheme, { kind, id }: Ref) {
  const { venue } = layout;
  const find = <T extends { id: string }>(list: readonly T[]) => list.find((item) => item.id === id);
  switch (kind) {
    case 'talker': {
      const talker = find(venue.talkers);
      return talker && <TalkerPanel talker={talker} />;
    }
    case 'microphone': {
      const microphone = find(scheme.microphones);
      return microphone && <MicrophonePanel microphone={microphone} />;
    }
    case 'loudspeaker': {
      const loudspeaker = find(scheme.loudspeakers);
      return loudspeaker && <LoudspeakerPanel loudspeaker={loudspeaker} />;
    }
    case 'seating': {
      const part = find(venue.seating);
      return part && (part.kind === 'block' ? <BlockPanel block={part} /> : <SeatListPanel list={part} />);
    }
    case 'seat':
      return seatsOf(venue.seating).some((seat) => seat.id === id) ? <SeatPanel id={id} /> : null;
    case 'face': {
      const face = find(venue.faces);
      return face && <FacePanel face={face} />;
    }
    case 'finish': {
      const finish = find(venue.finishes);
      return finish && <FinishPanel finish={finish} />;
    }
    case 'view': {
      const view = find(venue.views);
      return view && <ViewPanel view={view} />;
    }
    case 'scheme':
      return <SchemePanel />;
    case 'system':
      return <SystemPanel />;
    case 'routing':
      return <RoutingPanel />;
    case 'venue':
      return <VenuePanel />;
  }
}
