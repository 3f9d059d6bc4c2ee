// @vitest-environment happy-dom
import { screen } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { Link, Route, Routes } from 'react-router-dom';
import { describe, expect, it } from 'vitest';
import { PageTitle } from '../../src/ui/page-title';
import { render } from './render';

const pages = (
  <>
    <Link to="/two">Two</Link>
    <Link to="/two?sort=price">Sorted</Link>
    <Routes>
      <Route path="/" element={<PageTitle title="First page" />} />
      <Route path="/two" element={<PageTitle title="Second page" />} />
    </Routes>
  </>
);

describe('page title', () => {
  it('when a visit begins, then the tab is named and the focus is left alone', () => {
    render(pages);
    expect(document.title).toBe('First page · Spragyard');
    expect(screen.getByRole('heading', { level: 1 })).not.toHaveFocus();
  });

  it('when the reader moves to another page, then its heading has focus', async () => {
    render(pages);
    await userEvent.click(screen.getByRole('link', { name: 'Two' }));
    expect(document.title).toBe('Second page · Spragyard');
    expect(screen.getByRole('heading', { level: 1 })).toHaveFocus();
  });

  it('when only the query changes, then the focus stays where it was', async () => {
    render(pages);
    await userEvent.click(screen.getByRole('link', { name: 'Two' }));
    const sorted = screen.getByRole('link', { name: 'Sorted' });
    await userEvent.click(sorted);
    expect(sorted).toHaveFocus();
  });
});
