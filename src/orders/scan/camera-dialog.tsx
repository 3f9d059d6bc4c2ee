// Looks for a QR with the camera until it finds one; where the camera can't be used it says so, and the code is typed.
import { useEffect, useRef, useState } from 'react';
import { Button } from '../../ui/button';
import { Dialog } from '../../ui/dialog';
import { StopBox } from '../../ui/stop-box';
import { qrReader } from './read-qr';

interface CameraDialogProps {
  readonly onClose: () => void;
  readonly onRead: (text: string) => void;
}

const LOOK_EVERY_MS = 180;

const wait = (ms: number): Promise<void> => new Promise((resolve) => setTimeout(resolve, ms));

/** Starts the camera on the video and looks until a code is read or the signal stops it. */
async function watch(video: HTMLVideoElement, signal: AbortSignal): Promise<string | null> {
  const stream = await navigator.mediaDevices.getUserMedia({ video: { facingMode: 'environment' } });
  try {
    video.srcObject = stream;
    await video.play();
    const look = await qrReader();
    while (look && !signal.aborted) {
      const text = video.videoWidth > 0 ? await look(video) : null;
      if (text) return text;
      await wait(LOOK_EVERY_MS);
    }
    return null;
  } finally {
    for (const track of stream.getTracks()) track.stop();
  }
}

export function CameraDialog({ onClose, onRead }: CameraDialogProps) {
  const video = useRef<HTMLVideoElement>(null);
  const read = useRef(onRead);
  const [failed, setFailed] = useState(false);
  useEffect(() => {
    read.current = onRead;
  });
  useEffect(() => {
    const stop = new AbortController();
    const element = video.current;
    if (element) {
      watch(element, stop.signal)
        .then((text) => text && !stop.signal.aborted && read.current(text))
        .catch(() => !stop.signal.aborted && setFailed(true));
    }
    return () => stop.abort();
  }, []);
  return (
    <Dialog open onClose={onClose} title="Scan the tag" description="Hold the QR still, a hand away.">
      {failed && (
        <StopBox title="No camera" announce>
          <p>Allow the camera for this page, or type the code from the tag.</p>
        </StopBox>
      )}
      {/* The picture is only a viewfinder: what it finds is written into the field. */}
      <video ref={video} className="viewfinder" muted playsInline aria-label="Camera" hidden={failed} />
      <Button size="big" full onClick={onClose}>
        Type it instead
      </Button>
    </Dialog>
  );
}
