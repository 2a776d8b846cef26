import { fireEvent, render, screen, within } from '@testing-library/react';
import { describe, expect, it } from 'vitest';
import { heatColour } from '#shared/heat/heat-colour.ts';
import type { HeatPoint } from '#shared/heat/heat-stops.ts';
import { GlowStrip } from '../../../src/ui/GlowStrip.tsx';
import { SmallGlowStrip } from '../../../src/ui/SmallGlowStrip.tsx';

const CLIMB: readonly HeatPoint[] = [
  [0, 20],
  [29, 708],
  [46, 708],
  [60, 1005],
  [70, 900],
];

describe('GlowStrip', () => {
  it('is one image that says in words what it shows', () => {
    render(<GlowStrip points={CLIMB} alt="Climbs to 708 °C in 29 min." />);
    expect(screen.getByRole('img', { name: 'Climbs to 708 °C in 29 min.' })).toBeInTheDocument();
  });

  it('is read off along its minutes, in the reader’s unit', () => {
    render(<GlowStrip points={CLIMB} alt="A climb." unit="F" />);
    const reader = screen.getByRole('slider', { name: 'Read along the strip' });
    fireEvent.change(reader, { target: { value: '46' } });
    expect(reader).toHaveAttribute('aria-valuetext', '46\u00a0min, 1306\u00a0°F');
  });

  it('stops its gradient at the colours of its own temperatures', () => {
    const { container } = render(<GlowStrip points={CLIMB} alt="A climb." />);
    const colours = [...container.querySelectorAll('stop')].map((stop) =>
      stop.getAttribute('stop-color'),
    );
    expect(colours[0]).toBe(heatColour(20));
    expect(colours.at(-1)).toBe(heatColour(900));
    expect(colours).toContain(heatColour(1005));
  });

  it('ticks 573 °C and the target only where the climb reached them', () => {
    const { rerender, container } = render(
      <GlowStrip points={CLIMB} alt="A climb." targetCelsius={1005} />,
    );
    const shown = () => [...container.querySelectorAll('text')].map((text) => text.textContent);
    expect(shown()).toEqual(expect.arrayContaining(['573\u00a0°C', 'target 1005\u00a0°C']));
    rerender(<GlowStrip points={CLIMB.slice(0, 3)} alt="A climb." targetCelsius={1005} />);
    expect(shown()).not.toContain('target 1005\u00a0°C');
  });

  it('draws the hold as a bracket with its minutes', () => {
    const { container } = render(
      <GlowStrip points={CLIMB} alt="A climb." hold={{ fromMinute: 58, toMinute: 63.5 }} />,
    );
    expect(container.textContent).toContain('hold 5.5\u00a0min');
  });

  it('leaves a sentence in its place where there is no record', () => {
    render(<GlowStrip points={[]} alt="Fired by eye." />);
    expect(screen.getByText('Fired by eye.')).toBeInTheDocument();
    expect(screen.queryByRole('slider')).not.toBeInTheDocument();
  });
});

describe('SmallGlowStrip', () => {
  it('is an image without a tab stop', () => {
    const { container } = render(
      <SmallGlowStrip points={CLIMB} scaleMinutes={90} alt="A climb." />,
    );
    expect(screen.getByRole('img', { name: 'A climb.' })).toBeInTheDocument();
    expect(container.querySelector('[tabindex], input, a, button')).toBeNull();
  });

  it('ends torn, with its length in figures and in words, where it outruns the scale', () => {
    const { container } = render(
      <SmallGlowStrip points={CLIMB} scaleMinutes={60} alt="A climb." />,
    );
    const picture = screen.getByRole('img');
    expect(picture).toHaveAccessibleName('A climb. (70 min, longer than the scale)');
    expect(within(container).getByText('70 min')).toBeInTheDocument();
  });
});
