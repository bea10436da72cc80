import { lazy, Suspense } from 'react';
import ItemRegion from '../panels/ItemRegion';
import SeatTable from '../seats/SeatTable';
import './app.css';

const RoomView = lazy(() => import('../scene/RoomView'));

export default function App() {
  return (
    <main className="sheet">
      <Suspense fallback={<section className="room" aria-label="Room" />}>
        <RoomView />
      </Suspense>
      <ItemRegion />
      <SeatTable />
    </main>
  );
}
