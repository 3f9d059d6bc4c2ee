// Photos on their way to an order: each with its progress, and kept for another try where it failed.
import { useQueryClient } from '@tanstack/react-query';
import { useRef, useState } from 'react';
import { addOrderPhoto, type Order } from '../../../shared/orders/contract';
import type { PhotoPurpose } from '../../../shared/orders/states';
import { upload } from '../../http/client';
import { errorWords } from '../../ui/error-state';
import { orderQuery } from '../api';

export type OrderPhoto = Order['photos'][number];

export interface PendingPhoto {
  /** Also the idempotency key: a photo that arrived although the answer was lost is not added twice. */
  readonly key: string;
  readonly file: File;
  readonly shot: string | null;
  /** 0 to 1. */
  readonly share: number;
  /** Why it failed; null while it is on its way. */
  readonly failed: string | null;
}

export interface PhotoUploads {
  readonly pending: readonly PendingPhoto[];
  readonly add: (files: readonly File[], shot: string | null) => void;
  readonly retry: (key: string) => void;
  readonly drop: (key: string) => void;
}

/** @param onDone called with each photo once the server has it */
export function usePhotoUploads(
  orderId: string,
  purpose: PhotoPurpose,
  onDone?: (photo: OrderPhoto) => void,
): PhotoUploads {
  const client = useQueryClient();
  const [pending, setPending] = useState<readonly PendingPhoto[]>([]);
  const done = useRef(onDone);
  done.current = onDone;

  const change = (key: string, over: Partial<PendingPhoto>) =>
    setPending((old) => old.map((one) => (one.key === key ? { ...one, ...over } : one)));
  const drop = (key: string) => setPending((old) => old.filter((one) => one.key !== key));

  async function send(photo: PendingPhoto): Promise<void> {
    try {
      const added = await upload(addOrderPhoto, {
        params: { id: orderId },
        fields: { purpose, ...(photo.shot ? { shot: photo.shot } : {}) },
        file: photo.file,
        fileName: photo.file.name,
        idempotencyKey: photo.key,
        onProgress: (share) => change(photo.key, { share }),
      });
      client.setQueryData(orderQuery(orderId).queryKey, (order) =>
        order ? { ...order, photos: [...order.photos, added] } : order,
      );
      drop(photo.key);
      done.current?.(added);
    } catch (error) {
      change(photo.key, { failed: errorWords(error).detail });
    }
  }

  return {
    pending,
    add: (files, shot) => {
      const added = files.map((file): PendingPhoto => ({
        key: crypto.randomUUID(),
        file,
        shot,
        share: 0,
        failed: null,
      }));
      setPending((old) => [...old, ...added]);
      for (const photo of added) void send(photo);
    },
    retry: (key) => {
      const photo = pending.find((one) => one.key === key);
      if (!photo) return;
      const again = { ...photo, share: 0, failed: null };
      change(key, again);
      void send(again);
    },
    drop,
  };
}
