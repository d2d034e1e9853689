import { lazy, Suspense } from 'react';
import type { CameraScannerProps } from './camera-scanner';

const CameraScanner = lazy(() => import('./camera-scanner').then((module) => ({ default: module.CameraScanner })));

/** The camera, fetched when it is first wanted. */
export function LazyCameraScanner(props: CameraScannerProps) {
  return (
    <Suspense
      fallback={<p className="bg-ink-1 px-4 py-16 text-center text-row text-paper-0">The camera is starting.</p>}
    >
      <CameraScanner {...props} />
    </Suspense>
  );
}
