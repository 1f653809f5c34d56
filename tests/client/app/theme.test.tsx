import { act, cleanup, render, screen } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import '../charts/browser-stubs.ts';
import { ThemeSwitch } from '#src/app/theme-switch.tsx';
import { chooseTheme, startTheme } from '#src/app/theme.ts';

/** The system's own setting, as the browser tells it. */
function aSystem() {
  return Object.assign(new EventTarget(), {
    matches: false,
    media: '(prefers-color-scheme: dark)',
    onchange: null,
    addListener: () => undefined,
    removeListener: () => undefined,
  });
}
let system = aSystem();

beforeEach(() => {
  localStorage.clear();
  system = aSystem();
  vi.spyOn(window, 'matchMedia').mockImplementation(() => system);
});
afterEach(() => {
  cleanup();
  vi.restoreAllMocks();
});

const paper = () => document.documentElement.dataset['theme'];

describe('the theme', () => {
  it('follows the system until something else is chosen', () => {
    startTheme();
    expect(paper()).toBe('light');
    system.matches = true;
    system.dispatchEvent(new Event('change'));
    expect(paper()).toBe('dark');
    act(() => chooseTheme('light'));
    expect(paper()).toBe('light');
  });

  it('is remembered', () => {
    act(() => chooseTheme('dark'));
    document.documentElement.dataset['theme'] = 'light';
    startTheme();
    expect(paper()).toBe('dark');
  });

  it('is switched from a menu that says which one is in force', async () => {
    act(() => chooseTheme('dark'));
    render(<ThemeSwitch />);
    await userEvent.click(screen.getByRole('button', { name: 'Theme: Dark paper' }));
    const dark = screen.getByRole('menuitemradio', { name: 'Dark paper' });
    expect(dark.getAttribute('aria-checked')).toBe('true');
    await userEvent.click(screen.getByRole('menuitemradio', { name: 'Light paper' }));
    expect(paper()).toBe('light');
  });
});
