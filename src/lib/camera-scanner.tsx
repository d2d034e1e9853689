import { BrowserMultiFormatReader, type IScannerControls } from '@zxing/browser';
import { BarcodeFormat, DecodeHintType } from '@zxing/library';
import { useEffect, useEffectEvent, useRef, useState } from 'react';
import {
  cameraRefusalInWords,
  codeFromCamera,
  createRepeatFilter,
  insecureAddressWords,
  type CameraFormat,
} from './camera-codes';
import type { Scan } from './scanner-input';

const formats: ReadonlyMap<BarcodeFormat, CameraFormat> = new Map([
  [BarcodeFormat.CODE_128, 'code-128'],
  [BarcodeFormat.DATA_MATRIX, 'data-matrix'],
  [BarcodeFormat.QR_CODE, 'qr-code'],
]);

const constraints: MediaStreamConstraints = {
  video: { facingMode: 'environment', width: { ideal: 1280 }, height: { ideal: 720 } },
};

function createReader() {
  const hints = new Map<DecodeHintType, unknown>([
    [DecodeHintType.POSSIBLE_FORMATS, [...formats.keys()]],
    [DecodeHintType.ASSUME_GS1, true],
  ]);
  return new BrowserMultiFormatReader(hints, { delayBetweenScanAttempts: 100, delayBetweenScanSuccess: 200 });
}

export type CameraScannerProps = {
  /** Each code once, and the same code again only after two seconds without it. */
  onScan: (scan: Scan) => void;
  className?: string;
};

type Picture = { readonly is: 'starting' } | { readonly is: 'on' } | { readonly is: 'refused'; readonly words: string };

/** The picture of the camera behind the tablet, read until it is unmounted. Load it lazily: the decoder is large. */
export function CameraScanner({ onScan, className = '' }: CameraScannerProps) {
  const video = useRef<HTMLVideoElement>(null);
  const [isSecure] = useState(() => 'mediaDevices' in navigator);
  const [picture, setPicture] = useState<Picture>({ is: 'starting' });
  const take = useEffectEvent(onScan);

  useEffect(() => {
    const element = video.current;
    if (!isSecure || element === null) return;
    const isNew = createRepeatFilter();
    let controls: IScannerControls | undefined;
    let isGone = false;

    function start(into: HTMLVideoElement) {
      createReader()
        .decodeFromConstraints(constraints, into, (result) => {
          if (isGone || result === undefined) return;
          const format = formats.get(result.getBarcodeFormat()) ?? 'other';
          const text = codeFromCamera(result.getText(), format);
          const atMs = performance.now();
          if (isNew(text, atMs)) take({ text, entry: 'camera', atMs });
        })
        .then(
          (started) => {
            controls = started;
            // It came only after it was given up: it must go out again.
            if (isGone) started.stop();
            else setPicture({ is: 'on' });
          },
          (error: unknown) => {
            if (!isGone) setPicture({ is: 'refused', words: cameraRefusalInWords(error) });
          },
        );
    }

    // Effects run twice in development. A camera that is stopped takes the picture of the next one with it, so the first
    // of the two must never start.
    const timer = window.setTimeout(start, 0, element);
    return () => {
      isGone = true;
      window.clearTimeout(timer);
      controls?.stop();
    };
  }, [isSecure]);

  const refusal = isSecure ? (picture.is === 'refused' ? picture.words : null) : insecureAddressWords;
  if (refusal !== null) {
    return (
      <p role="alert" className="bg-straw-1 px-5 py-4 text-row shadow-[inset_0_0_0_2px_var(--color-straw-3)]">
        {refusal}
      </p>
    );
  }
  return (
    <div className={`relative overflow-hidden bg-ink-1 ${className}`}>
      <video
        ref={video}
        muted
        playsInline
        className="block aspect-video w-full object-cover"
        aria-label="Picture of the camera"
      />
      <div aria-hidden="true" className="absolute inset-[18%] shadow-[0_0_0_2px_var(--color-film-2)]" />
      <p
        role="status"
        className="absolute right-0 bottom-0 left-0 bg-ink-1/80 px-4 py-2 text-center text-row text-paper-0"
      >
        {picture.is === 'on' ? 'Hold the code inside the frame.' : 'The camera is starting.'}
      </p>
    </div>
  );
}
