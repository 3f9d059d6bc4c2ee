// Takes a photo with the phone's camera, or a file where there is none. A real file field, so any phone's own camera works.
import { Camera } from 'lucide-react';
import { buttonClass, type ButtonLook } from '../button';
import { Icon } from '../icon';

interface PhotoButtonProps extends Pick<ButtonLook, 'look' | 'size' | 'full'> {
  /** "Shoot 3, bell face" */
  readonly children: string;
  readonly onFiles: (files: readonly File[]) => void;
  /** Opens the camera at once on a phone; without it the phone also offers its gallery. */
  readonly cameraOnly?: boolean;
  readonly multiple?: boolean;
  readonly disabled?: boolean;
}

export function PhotoButton(props: PhotoButtonProps) {
  const { children, onFiles, cameraOnly = false, multiple = false, disabled = false, ...look } = props;
  return (
    <label className={buttonClass(look)} aria-disabled={disabled || undefined}>
      <Icon of={Camera} />
      {children}
      <input
        className="vh"
        type="file"
        // The kinds the server takes; a phone that shoots another kind hands over a JPEG instead.
        accept="image/jpeg,image/png,image/webp"
        multiple={multiple}
        disabled={disabled}
        {...(cameraOnly ? { capture: 'environment' } : {})}
        onChange={(event) => {
          onFiles([...(event.target.files ?? [])]);
          // The same photo may be chosen again after a failed upload.
          event.target.value = '';
        }}
      />
    </label>
  );
}
