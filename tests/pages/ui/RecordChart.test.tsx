import { act, fireEvent, render, screen, within } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import type { HeatPoint } from '#shared/heat/heat-stops.ts';
import type { RecordChartProps } from '../../../src/ui/chart/record-chart-props.ts';
import { RecordChart } from '../../../src/ui/RecordChart.tsx';

/** 10 °C a minute for 100 minutes, two readings a minute. */
const CLIMB = Array.from({ length: 201 }, (_, index): HeatPoint => [index / 2, index * 5]);
const STALL = [{ fromMinute: 40, toMinute: 60, label: 'stall 500\u00a0°C, 20\u00a0min' }];
const HOLD = { fromMinute: 90, toMinute: 95 };
/** What jsdom does not lay out: the plot is 1,000 px wide. */
const PLOT_PX = 1000;

beforeEach(() => {
  vi.spyOn(HTMLElement.prototype, 'getBoundingClientRect').mockReturnValue(
    new DOMRect(0, 0, PLOT_PX, 300),
  );
  HTMLElement.prototype.setPointerCapture = () => undefined;
});
afterEach(() => {
  vi.restoreAllMocks();
  vi.useRealTimers();
});

function show(props: Partial<RecordChartProps> = {}) {
  const view = render(<RecordChart points={CLIMB} alt="A climb." {...props} />);
  const bar = within(screen.getByRole('group', { name: 'What the chart shows' }));
  const slider = screen.getByRole('slider', { name: 'Read along the curve' });
  const surface = slider.parentElement;
  if (!surface) throw new Error('The chart has nothing to point at.');
  return {
    ...view,
    bar,
    slider,
    surface,
    shown: () => bar.getByText(/min$/, { selector: '.reading' }).textContent,
  };
}

describe('RecordChart looked at more closely', () => {
  it('has a button for every way of it', async () => {
    const user = userEvent.setup();
    const { bar, shown } = show({ stretches: STALL, hold: HOLD });
    expect(shown()).toBe('all of it, 0 to 100\u00a0min');
    await user.click(bar.getByRole('button', { name: 'Look closer' }));
    expect(shown()).toBe('25 to 75\u00a0min of 0 to 100\u00a0min');
    await user.click(bar.getByRole('button', { name: 'Later minutes' }));
    expect(shown()).toBe('50 to 100\u00a0min of 0 to 100\u00a0min');
    expect(bar.getByRole('button', { name: 'Later minutes' })).toHaveAttribute('aria-disabled');
    await user.click(bar.getByRole('button', { name: 'Earlier minutes' }));
    await user.click(bar.getByRole('button', { name: 'Look from further away' }));
    expect(shown()).toBe('all of it, 0 to 100\u00a0min');
    await user.click(bar.getByRole('button', { name: /^To stall 500/ }));
    expect(shown()).toBe('33 to 67\u00a0min of 0 to 100\u00a0min');
    await user.click(bar.getByRole('button', { name: /^To hold 5/ }));
    expect(shown()).toBe('88.3 to 96.8\u00a0min of 0 to 100\u00a0min');
    await user.click(bar.getByRole('button', { name: 'Whole' }));
    expect(shown()).toBe('all of it, 0 to 100\u00a0min');
  });

  it('takes +, −, 0 and arrows, but only while the keyboard is on the chart', async () => {
    const user = userEvent.setup();
    const { slider, shown } = show();
    await user.keyboard('++');
    expect(shown()).toBe('all of it, 0 to 100\u00a0min');
    slider.focus();
    await user.keyboard('+');
    expect(shown()).toBe('0 to 50\u00a0min of 0 to 100\u00a0min');
    expect(slider).toHaveAttribute('aria-valuetext', '0\u00a0min, 0\u00a0°C');
    await user.keyboard('{ArrowRight}{ArrowRight}');
    expect(slider).toHaveAttribute('aria-valuetext', '1\u00a0min, 10\u00a0°C');
    // Read on past the edge, what is shown comes along.
    await user.keyboard('{End}');
    expect(slider).toHaveAttribute('aria-valuetext', '100\u00a0min, 1000\u00a0°C');
    expect(shown()).toBe('50 to 100\u00a0min of 0 to 100\u00a0min');
    await user.keyboard('{Shift>}{ArrowLeft}{/Shift}');
    expect(shown()).toBe('38 to 88\u00a0min of 0 to 100\u00a0min');
    await user.keyboard('-');
    expect(shown()).toBe('all of it, 0 to 100\u00a0min');
    await user.keyboard('+0');
    expect(shown()).toBe('all of it, 0 to 100\u00a0min');
  });

  it('leaves the browser’s own keys alone', () => {
    const { slider, shown } = show();
    slider.focus();
    expect(fireEvent.keyDown(slider, { key: '+', ctrlKey: true })).toBe(true);
    expect(fireEvent.keyDown(slider, { key: 'Tab' })).toBe(true);
    expect(shown()).toBe('all of it, 0 to 100\u00a0min');
  });

  it('shows the minutes a mouse drags over, and not those it only presses on', () => {
    const { surface, shown } = show();
    const mouse = { button: 0, pointerType: 'mouse', pointerId: 1 };
    fireEvent.pointerDown(surface, { ...mouse, clientX: 200 });
    fireEvent.pointerUp(surface, { ...mouse, clientX: 200 });
    expect(shown()).toBe('all of it, 0 to 100\u00a0min');
    fireEvent.pointerDown(surface, { ...mouse, clientX: 600 });
    fireEvent.pointerMove(surface, { ...mouse, clientX: 200 });
    fireEvent.pointerUp(surface, { ...mouse, clientX: 200 });
    expect(shown()).toBe('20 to 60\u00a0min of 0 to 100\u00a0min');
  });

  it('lets go of a drag on Escape', () => {
    const { surface, slider, shown } = show();
    const mouse = { button: 0, pointerType: 'mouse', pointerId: 1 };
    fireEvent.pointerDown(surface, { ...mouse, clientX: 600 });
    fireEvent.pointerMove(surface, { ...mouse, clientX: 200 });
    fireEvent.keyDown(slider, { key: 'Escape' });
    fireEvent.pointerUp(surface, { ...mouse, clientX: 200 });
    expect(shown()).toBe('all of it, 0 to 100\u00a0min');
  });

  it('reads off under a finger and selects nothing with it', () => {
    const { surface, slider, shown } = show();
    const finger = { button: 0, pointerType: 'touch', pointerId: 2 };
    fireEvent.pointerDown(surface, { ...finger, clientX: 200 });
    fireEvent.pointerMove(surface, { ...finger, clientX: 700 });
    expect(slider).toHaveAttribute('aria-valuetext', '70\u00a0min, 700\u00a0°C');
    fireEvent.pointerUp(surface, { ...finger, clientX: 700 });
    expect(shown()).toBe('all of it, 0 to 100\u00a0min');
  });

  it('takes the wheel only with Ctrl, which a pinch on a touchpad also is', () => {
    const { surface, shown } = show();
    expect(fireEvent.wheel(surface, { deltaY: -40, clientX: 500 })).toBe(true);
    expect(shown()).toBe('all of it, 0 to 100\u00a0min');
    expect(fireEvent.wheel(surface, { deltaY: -40, ctrlKey: true, clientX: 500 })).toBe(false);
    expect(shown()).toBe('14 to 86\u00a0min of 0 to 100\u00a0min');
  });

  it('says politely what it shows, once somebody has asked', () => {
    vi.useFakeTimers();
    const { bar } = show();
    const tell = (): void => {
      act(() => {
        vi.advanceTimersByTime(1000);
      });
    };
    tell();
    expect(bar.getByRole('status')).toBeEmptyDOMElement();
    fireEvent.click(bar.getByRole('button', { name: 'Look closer' }));
    tell();
    expect(bar.getByRole('status')).toHaveTextContent(
      'The chart shows 25 to 75 min of 0 to 100 min.',
    );
    fireEvent.click(bar.getByRole('button', { name: 'Whole' }));
    tell();
    expect(bar.getByRole('status')).toHaveTextContent('The chart shows the whole record.');
  });

  it('tells which part is in sight and reads the part it is given', () => {
    const onWindow = vi.fn();
    const { bar, slider, rerender } = show({ onWindow, count: 50_000 });
    fireEvent.click(bar.getByRole('button', { name: 'Look closer' }));
    expect(onWindow).toHaveBeenLastCalledWith({ from: 25, to: 75 });
    const points: HeatPoint[] = [
      [20, 0],
      [80, 600],
    ];
    const detail = { part: { from: 20, to: 80 }, points, secondProbe: null };
    rerender(
      <RecordChart
        points={CLIMB}
        alt="A climb."
        onWindow={onWindow}
        count={50_000}
        detail={detail}
      />,
    );
    slider.focus();
    fireEvent.keyDown(slider, { key: 'PageUp' });
    expect(slider).toHaveAttribute('aria-valuetext', '30\u00a0min, 100\u00a0°C');
    fireEvent.click(bar.getByRole('button', { name: 'Whole' }));
    expect(onWindow).toHaveBeenLastCalledWith(null);
  });
});

describe('RecordChart of other lines', () => {
  const OVERLAY = {
    points: CLIMB.map(([minute, celsius]): HeatPoint => [minute + 20, celsius / 2]),
    label: 'earlier firing, “Before the fibre”',
    shiftMinutes: -20,
  };
  const SECOND = CLIMB.map(([minute, celsius]): HeatPoint => [minute, celsius * 0.9]);

  it('names them in the key and on the line, and draws each with dashes of its own', () => {
    const { container } = show({ overlay: OVERLAY, secondProbe: SECOND });
    expect(screen.getAllByText(OVERLAY.label)).toHaveLength(3);
    const drawing = screen.getByRole('img', { name: 'A climb.' });
    const dashes = [...drawing.querySelectorAll('g[clip-path] path[stroke-dasharray]')].map(
      (path) => path.getAttribute('stroke-dasharray'),
    );
    expect(new Set(dashes).size).toBe(2);
    expect(container.querySelectorAll('figure ul li')).toHaveLength(4);
  });

  it('reads all of them off at one minute, with the mark that is near', () => {
    const { slider } = show({
      overlay: OVERLAY,
      secondProbe: SECOND,
      marks: [{ minute: 61, label: 'flue closed 40\u00a0%', kind: 'flue-closed' }],
    });
    slider.focus();
    fireEvent.change(slider, { target: { value: '60' } });
    expect(slider.getAttribute('aria-valuetext')?.split('; ')).toEqual([
      '60\u00a0min, 600\u00a0°C',
      '540\u00a0°C, second probe',
      '300\u00a0°C, earlier firing, “Before the fibre”',
      '61\u00a0min: flue closed 40\u00a0%',
    ]);
  });

  it('has the same as a table, with all readings one link away', () => {
    show({ overlay: OVERLAY, secondProbe: SECOND, count: 50_000, csvHref: '/all.csv' });
    const table = screen.getByRole('table', { hidden: true });
    const heads = within(table).getAllByRole('columnheader', { hidden: true });
    expect(heads.map((head) => head.textContent)).toEqual([
      'Minute',
      'Temperature',
      'Second probe',
      OVERLAY.label,
    ]);
    expect(
      within(table).getByText(/Every 1 min .* the record has 50000 readings/),
    ).toBeInTheDocument();
    const row = within(table).getByRole('rowheader', { name: '60', hidden: true }).closest('tr');
    expect(row).toHaveTextContent('60600 °C540 °C300 °C');
    const link = screen.getByRole('link', { name: 'All 50000 readings as CSV', hidden: true });
    expect(link).toHaveAttribute('href', '/all.csv');
  });
});

describe('RecordChart of very many readings', () => {
  it('draws no more of them than four a column of pixels, and loses no peak', () => {
    const points = Array.from({ length: 50_000 }, (_, second): HeatPoint => [
      second / 60,
      second === 31_415 ? 999 : 700 + 5 * Math.sin(second),
    ]);
    const { container, bar } = show({ points });
    const longest = () =>
      Math.max(
        ...[...container.querySelectorAll('path')].map(
          (path) => path.getAttribute('d')?.split('L').length ?? 0,
        ),
      );
    const columns = 720 - 58 - 8;
    expect(longest()).toBeGreaterThan(columns);
    expect(longest()).toBeLessThanOrEqual(4 * columns + 2);
    const highest = () =>
      Math.min(
        ...[...container.querySelectorAll('.readings')].flatMap((path) =>
          [...(path.getAttribute('d') ?? '').matchAll(/[ML][-\d.]+ ([-\d.]+)/g)].map(([, y]) =>
            Number(y),
          ),
        ),
      );
    // One wild second at 999 °C on a plot 288 px tall that ends at 1100 °C, 8 px from the top.
    expect(highest()).toBeCloseTo(8 + 288 * (1 - 999 / 1100), 0);
    fireEvent.click(bar.getByRole('button', { name: 'Look closer' }));
    expect(longest()).toBeLessThanOrEqual(4 * columns + 2);
  });

  it('is a sentence where there is no record', () => {
    render(<RecordChart points={[]} alt="Fired by eye." />);
    expect(screen.getByText('Fired by eye.')).toBeInTheDocument();
    expect(screen.queryByRole('slider')).not.toBeInTheDocument();
  });
});
