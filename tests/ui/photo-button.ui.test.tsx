// @vitest-environment happy-dom
import { screen } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { describe, expect, it, vi } from 'vitest';
import { PhotoButton } from '../../src/ui/form/photo-button';
import { render } from './render';

describe('photo button', () => {
  it('when a photo is taken twice, then both times it is handed on', async () => {
    const onFiles = vi.fn();
    render(<PhotoButton onFiles={onFiles}>Shoot 3, bell face</PhotoButton>);
    const photo = new File(['x'], 'bell.jpg', { type: 'image/jpeg' });
    const field = screen.getByLabelText('Shoot 3, bell face');
    await userEvent.upload(field, photo);
    expect(field).toHaveValue('');
    await userEvent.upload(field, photo);
    expect(onFiles).toHaveBeenCalledTimes(2);
    expect(onFiles).toHaveBeenLastCalledWith([photo]);
  });
});
