// @vitest-environment happy-dom
import { screen } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { useState } from 'react';
import { describe, expect, it } from 'vitest';
import { CodeInput } from '../../src/ui/form/code-input';
import { CodePlate } from '../../src/ui/code-plate';
import { JointStrip } from '../../src/ui/joint-strip';
import { render } from './render';

function Code() {
  const [code, setCode] = useState('');
  return (
    <CodeInput
      label="Case code"
      value={code}
      onChange={setCode}
      groups={[4, 2, 2, 5, 2]}
      readBack={`Read: ${code}`}
    />
  );
}

const field = () => screen.getByLabelText('Case code');

describe('code input', () => {
  it('when a code is pasted with spaces and small letters, then it is capitals without spaces, at most its length', async () => {
    render(<Code />);
    await userEvent.click(field());
    await userEvent.paste('k66a 4x-d9 0914? 03 999');
    expect(field()).toHaveValue('K66A4XD90914?03');
  });

  it('when characters are typed, then what is read is said', async () => {
    render(<Code />);
    await userEvent.type(field(), 'k66a');
    expect(field()).toHaveValue('K66A');
    expect(field()).toHaveAccessibleDescription('Read: K66A');
  });
});

describe('what a reader hears of a code and of joints', () => {
  it('when a character is doubtful, then the plate says which', () => {
    render(<CodePlate groups={['K66A', '4X']} doubtful={[3]} />);
    expect(screen.getByRole('img')).toHaveAccessibleName('Case code K66A 4X, not sure of A');
  });

  it('when joints are drawn, then each is named with its verdict', () => {
    render(
      <JointStrip
        joints={[
          { name: 'Converter', state: 'fits' },
          { name: 'Plug', state: 'with_part' },
          { name: 'Length', state: 'not_known' },
        ]}
      />,
    );
    expect(screen.getByRole('img')).toHaveAccessibleName(
      'Converter: fits. Plug: needs a part. Length: not known',
    );
  });
});
