// Checks a vehicle number and tells its model year; never refuses one, for vehicles from abroad have no check digit.
import { useQuery } from '@tanstack/react-query';
import { useState } from 'react';
import type { z } from 'zod';
import type { decodeVins } from '../../shared/reading/contract';
import { FourStates } from '../ui/four-states';
import { Flag } from '../ui/flag';
import { TextInput } from '../ui/form/text-input';
import { vinQuery } from './api';
import { useSettled } from './use-settled';

const PAUSE_MS = 300;

type Decoded = z.output<NonNullable<typeof decodeVins.answer>>;

const yearWords = ({ modelYear, modelYears }: Decoded): string => {
  if (modelYear === null) return 'Not told';
  const other = modelYears.find((year) => year !== modelYear);
  return other === undefined
    ? String(modelYear)
    : `${modelYear} (${other} for heavy vehicles and motorcycles)`;
};

interface ResultProps {
  readonly decoded: Decoded;
  readonly onTake: (vin: string) => void;
}

function Result({ decoded, onTake }: ResultProps) {
  const { valid, problems, suggestion, vehicle } = decoded;
  return (
    <div className="grid gap-10" role="status">
      <p className="flex flex-wrap items-center gap-10">
        <Flag tone={valid ? 'fits' : 'with_part'}>{valid ? 'Adds up' : 'Does not add up'}</Flag>
        <span className="code">{decoded.vin}</span>
      </p>
      {problems.length > 0 && (
        <ul className="candidate-notes">
          {problems.map((problem) => (
            <li key={problem.message}>{problem.message}</li>
          ))}
        </ul>
      )}
      {suggestion && (
        <p>
          <button type="button" className="link" onClick={() => onTake(suggestion)}>
            Read it as {suggestion}
          </button>
        </p>
      )}
      <dl className="figures num">
        <div>
          <dt>Model year</dt>
          <dd>{yearWords(decoded)}</dd>
        </div>
        {vehicle && (
          <div>
            <dt>Maker’s home</dt>
            <dd>{vehicle.region}</dd>
          </div>
        )}
      </dl>
      <p className="sm mute">
        The number tells the model year, not the transmission, and not the day it was built. Trust the stamp
        on the case.
      </p>
    </div>
  );
}

export function VinCheck() {
  const [typed, setTyped] = useState('');
  const vin = useSettled(typed.trim(), PAUSE_MS);
  const options = vinQuery(vin);
  const query = useQuery({ ...options, placeholderData: (before) => before });
  return (
    <div className="grid gap-14">
      <TextInput
        label="Vehicle number (VIN)"
        hint="17 characters since model year 1981. It stays on this page."
        code
        name="vin"
        maxLength={40}
        value={typed}
        onChange={(event) => setTyped(event.target.value)}
      />
      {options.enabled === true && (
        <FourStates query={query} waiting="Checking the number">
          {(decoded) => <Result decoded={decoded} onTake={setTyped} />}
        </FourStates>
      )}
    </div>
  );
}
