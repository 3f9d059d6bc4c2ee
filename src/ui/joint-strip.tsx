// All joints of a unit in their fixed order, one glyph each; a reader hears every joint with its verdict.
import { JointGlyph, JOINT_SPOKEN, JOINT_WORDS, type JointState } from './art/joint-glyph';

export interface Joint {
  /** "Bellhousing" */
  readonly name: string;
  readonly state: JointState;
}

export function JointStrip({
  joints,
  size = 22,
}: {
  readonly joints: readonly Joint[];
  readonly size?: number;
}) {
  const label = joints.map((joint) => `${joint.name}: ${JOINT_SPOKEN[joint.state]}`).join('. ');
  return (
    <span className="strip" role="img" aria-label={label}>
      {joints.map((joint) => (
        <JointGlyph key={joint.name} state={joint.state} size={size} />
      ))}
    </span>
  );
}

/** Glyph and word for one verdict row. */
export function JointVerdict({ state }: { readonly state: JointState }) {
  return (
    <span className="inline-flex items-center gap-10 nw font-strong">
      <JointGlyph state={state} />
      {JOINT_WORDS[state]}
    </span>
  );
}
