import { lazy, Suspense, useEffect, useState } from 'react';
import { Group, Panel, Separator, useDefaultLayout } from 'react-resizable-panels';
import ItemRegion from '../panels/ItemRegion';
import SeatTable from '../seats/SeatTable';
import ErrorBoundary from './ErrorBoundary';
import { listenForFiles } from './files';
import Head from './Head';
import NoticeBox from './NoticeBox';
import Palette from './Palette';
import { listenForShortcuts } from './shortcuts';
import VerdictLine from './VerdictLine';
import './app.css';

const RoomView = lazy(() => import('../scene/RoomView'));

/** The one screen: head and verdict across, then the room, the item and the seats with borders that can be moved. */
export default function App() {
  const [palette, setPalette] = useState(false);
  useEffect(() => listenForShortcuts(() => setPalette(true)), []);
  useEffect(() => listenForFiles(), []);
  return (
    <ErrorBoundary>
      <div className="sheet">
        <Head openPalette={() => setPalette(true)} />
        <VerdictLine />
        <Regions />
      </div>
      <Palette isOpen={palette} close={() => setPalette(false)} />
      <NoticeBox />
    </ErrorBoundary>
  );
}

function Regions() {
  const across = useDefaultLayout({ id: 'gainwright-across', onlySaveAfterUserInteractions: true });
  const down = useDefaultLayout({ id: 'gainwright-down', onlySaveAfterUserInteractions: true });
  const narrow = window.innerWidth <= 1100;
  return (
    <main className="regions">
      <Group {...across}>
        <Panel id="left" minSize={420}>
          <Group orientation="vertical" {...down}>
            <Panel id="room" minSize={180}>
              <Suspense fallback={<section className="room" aria-label="Room" />}>
                <RoomView />
              </Suspense>
            </Panel>
            <Separator className="border border-down" aria-label="Height of the seat table" />
            <Panel id="seats" defaultSize={246} minSize={100} groupResizeBehavior="preserve-pixel-size">
              <SeatTable />
            </Panel>
          </Group>
        </Panel>
        <Separator className="border border-across" aria-label="Width of the item" />
        <Panel
          id="item"
          defaultSize={narrow ? 264 : 304}
          minSize={240}
          maxSize={520}
          groupResizeBehavior="preserve-pixel-size"
        >
          <ItemRegion />
        </Panel>
      </Group>
    </main>
  );
}
