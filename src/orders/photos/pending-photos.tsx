// Photos that are still going up, and those that didn't: each says why and can be tried again.
import { Button } from '../../ui/button';
import { ProgressRule } from '../../ui/steel-rule';
import type { PhotoUploads } from './use-photo-uploads';

export function PendingPhotos({ uploads }: { readonly uploads: PhotoUploads }) {
  if (uploads.pending.length === 0) return null;
  return (
    <ul className="grid gap-10" aria-label="Photos on their way">
      {uploads.pending.map((photo) =>
        photo.failed === null ? (
          <li key={photo.key}>
            <ProgressRule
              label={photo.file.name}
              done={Math.round(photo.share * 100)}
              of={100}
              words={photo.share < 1 ? `${Math.round(photo.share * 100)} %` : 'Checking it'}
            />
          </li>
        ) : (
          <li key={photo.key} className="stopbox" role="alert">
            <p className="b">
              {photo.file.name}: {photo.failed}
            </p>
            <div className="mt-10 flex flex-wrap gap-10">
              <Button look="reversed" size="small" onClick={() => uploads.retry(photo.key)}>
                Try again
              </Button>
              <Button look="reversed" size="small" onClick={() => uploads.drop(photo.key)}>
                Leave it out
              </Button>
            </div>
          </li>
        ),
      )}
    </ul>
  );
}
