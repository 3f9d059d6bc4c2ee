// Reads a QR out of a picture: with the browser's own detector where it has one, else with a decoder fetched when needed.

/** One look at a frame: the text of a QR in it, or null. */
export type LookForQr = (video: HTMLVideoElement) => Promise<string | null>;

interface NativeDetector {
  readonly detect: (source: HTMLVideoElement) => Promise<readonly { readonly rawValue: string }[]>;
}

interface NativeDetectorClass {
  new (options: { readonly formats: readonly string[] }): NativeDetector;
  readonly getSupportedFormats: () => Promise<readonly string[]>;
}

declare global {
  interface Window {
    readonly BarcodeDetector?: NativeDetectorClass;
  }
}

async function nativeLook(): Promise<LookForQr | null> {
  const Detector = window.BarcodeDetector;
  if (!Detector || !(await Detector.getSupportedFormats()).includes('qr_code')) return null;
  const detector = new Detector({ formats: ['qr_code'] });
  return async (video) => (await detector.detect(video))[0]?.rawValue ?? null;
}

/** Larger frames cost time and read no better. */
const WIDTH_PX = 640;

async function decoderLook(): Promise<LookForQr | null> {
  const { default: decode } = await import('jsqr');
  const canvas = document.createElement('canvas');
  const context = canvas.getContext('2d', { willReadFrequently: true });
  if (!context) return null;
  return (video) => {
    const scale = WIDTH_PX / video.videoWidth;
    canvas.width = WIDTH_PX;
    canvas.height = Math.round(video.videoHeight * scale);
    context.drawImage(video, 0, 0, canvas.width, canvas.height);
    const frame = context.getImageData(0, 0, canvas.width, canvas.height);
    return Promise.resolve(decode(frame.data, frame.width, frame.height)?.data ?? null);
  };
}

/** The best reader this browser has; null where it can read none. */
export const qrReader = async (): Promise<LookForQr | null> => (await nativeLook()) ?? decoderLook();
