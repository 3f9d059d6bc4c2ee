// The bar at the top of the receiving desk: scan or type a tag, and go to what it belongs to.
import { useQueryClient } from '@tanstack/react-query';
import { Camera, ScanBarcode } from 'lucide-react';
import { useState, type FormEvent, type ReactNode } from 'react';
import { useNavigate } from 'react-router-dom';
import { formatTag, isTagCode, normaliseTag } from '../../../shared/kernel/tag-code';
import { paths } from '../../paths';
import { Button } from '../../ui/button';
import { errorWords } from '../../ui/error-state';
import { Icon } from '../../ui/icon';
import { StopBox } from '../../ui/stop-box';
import { tagQuery } from '../api';
import { CameraDialog } from '../scan/camera-dialog';

interface ScanBarProps {
  /** The tag of the core that is being worked on. */
  readonly tag?: string | null;
  /** What was found: "Order 4468, due back by 21 Mar". */
  readonly result?: ReactNode;
}

const NOT_A_TAG = 'This is no tag code of ours. It has nine characters, such as AB12-CD34-E. Check each one.';

export function ScanBar({ tag, result }: ScanBarProps) {
  const client = useQueryClient();
  const navigate = useNavigate();
  const [text, setText] = useState(tag ? formatTag(tag) : '');
  const [scanning, setScanning] = useState(false);
  const [looking, setLooking] = useState(false);
  const [refusal, setRefusal] = useState<string | null>(null);

  async function find(typed: string) {
    const code = normaliseTag(typed);
    setText(formatTag(code));
    if (!isTagCode(code)) {
      setRefusal(NOT_A_TAG);
      return;
    }
    setRefusal(null);
    setLooking(true);
    try {
      const found = await client.fetchQuery(tagQuery(code));
      if (found.kind === 'core' && found.orderId) void navigate(paths.receive.to({ orderId: found.orderId }));
      else if (found.orderId) void navigate(paths.order.to({ id: found.orderId }));
      else setRefusal('This tag belongs to no order of yours.');
    } catch (error) {
      setRefusal(errorWords(error).detail);
    } finally {
      setLooking(false);
    }
  }
  const submit = (event: FormEvent) => {
    event.preventDefault();
    void find(text);
  };
  return (
    <div className="scan-box">
      <form className="scan" onSubmit={submit} role="search" aria-label="Find a tag">
        <label htmlFor="scan-tag">
          <Icon of={ScanBarcode} size={30} />
          <span className="b">Scan the core tag</span>
        </label>
        <input
          id="scan-tag"
          value={text}
          autoCapitalize="characters"
          autoComplete="off"
          spellCheck={false}
          placeholder="AB12-CD34-E"
          onChange={(event) => setText(event.target.value)}
        />
        <div className="scan-tools">
          <Button icon={Camera} onClick={() => setScanning(true)} aria-label="Scan with the camera" />
          <Button type="submit" look="ink" busy={looking} busyWords="Looking">
            Find
          </Button>
        </div>
        {result && <div className="scan-result">{result}</div>}
      </form>
      {refusal && (
        <StopBox title="Not found" announce>
          <p>{refusal}</p>
        </StopBox>
      )}
      {scanning && (
        <CameraDialog
          onClose={() => setScanning(false)}
          onRead={(read) => {
            setScanning(false);
            void find(read);
          }}
        />
      )}
    </div>
  );
}
