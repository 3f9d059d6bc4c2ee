// The first stop of the tab key: past the header, to the page.
export const MAIN_ID = 'main';

export function SkipLink() {
  return (
    <a className="skip" href={`#${MAIN_ID}`}>
      Skip to content
    </a>
  );
}
