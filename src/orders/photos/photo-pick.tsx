// A button that takes photos: the camera on a phone, files on a desk.
import { Camera } from 'lucide-react';
import { useId } from 'react';
import type { ButtonLook } from '../../ui/button';
import { buttonClass } from '../../ui/button';
import { Icon } from '../../ui/icon';

/** What the server takes; naming JPEG makes a phone hand over JPEG instead of its own format. */
export const PHOTO_TYPES = 'image/jpeg,image/png,image/webp';

interface PhotoPickProps extends ButtonLook {
  readonly children: string;
  readonly onFiles: (files: readonly File[]) => void;
  readonly several?: boolean;
  readonly disabled?: boolean;
  readonly describedBy?: string;
}

/** The input itself takes the keyboard; its label is the button to the eye. */
export function PhotoPick(props: PhotoPickProps) {
  const { children, onFiles, several = false, disabled = false, describedBy, ...look } = props;
  const id = useId();
  return (
    <span className="photo-pick">
      <input
        id={id}
        className="vh"
        type="file"
        accept={PHOTO_TYPES}
        multiple={several}
        disabled={disabled}
        aria-describedby={describedBy}
        onChange={(event) => {
          onFiles([...(event.target.files ?? [])]);
          // The same file may be chosen again after it was removed.
          event.target.value = '';
        }}
      />
      <label htmlFor={id} className={buttonClass(look)}>
        <Icon of={Camera} />
        {children}
      </label>
    </span>
  );
}
