// Steps in a channel between two races: proved sprags are tipped, the live one is red, the rest stand upright.
import { Sprag, STEP_WORDS, type StepState } from './art/sprag';

export interface RaceStep {
  readonly label: string;
  readonly state: StepState;
}

interface StepRaceProps {
  /** "Shots" or "Steps of this listing". */
  readonly label: string;
  readonly steps: readonly RaceStep[];
  /** Writes the labels beside the sprags; a reader always hears them. */
  readonly words?: boolean;
}

export function StepRace({ label, steps, words = false }: StepRaceProps) {
  return (
    <ol className="step-race" aria-label={label}>
      {steps.map((step) => (
        <li
          key={step.label}
          className={`step-mark step-${step.state}`}
          aria-current={step.state === 'now' ? 'step' : undefined}
        >
          <Sprag state={step.state} size={step.state === 'now' ? 38 : 32} />
          <span className={words ? 'step-word' : 'vh'}>{step.label}</span>
          <span className="vh">, {STEP_WORDS[step.state]}</span>
        </li>
      ))}
    </ol>
  );
}
