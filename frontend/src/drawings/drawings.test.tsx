import { fireEvent, render, screen } from '@testing-library/react';
import { describe, expect, it, vi } from 'vitest';
import { AboveDrawing } from './above-drawing.tsx';
import { AsternDrawing } from './astern-drawing.tsx';
import type { BoatScene } from './boat-scene.ts';
import { sampleScene } from './sample-scene.ts';
import { SideDrawing } from './side-drawing.tsx';

const lengthText = (mm: number) => `${Math.round(mm)} mm`;
const strut = { fromDeg: 4, toDeg: 31, kind: 'hidden', share: 0.5, by: 'strut' } as const;
const sliver = { fromDeg: 36, toDeg: 38, kind: 'thinned', share: 0.02, by: 'skeg' } as const;
const scene = (sectors: BoatScene['sectors']): BoatScene => ({ ...sampleScene(), sectors });
const wedges = (box: HTMLElement, side: string) =>
  [...box.querySelectorAll(`[data-wedge^="${side}"]`)].map((wedge) => wedge.getAttribute('data-wedge')?.split(' ')[1]);

describe('the boat from astern', () => {
  const draw = (sectors: BoatScene['sectors']) =>
    render(<AsternDrawing scene={scene(sectors)} alternative="Seen from astern, port hidden by the strut." lengthText={lengthText} />);

  it('says in words what it shows', () => {
    draw({ port: [strut], starboard: [] });
    expect(screen.getByRole('img', { name: 'Seen from astern, port hidden by the strut.' })).toBeInTheDocument();
  });

  it('hatches what is hidden, dots what is thinned and leaves the rest open', () => {
    const { container } = draw({ port: [strut, sliver], starboard: [] });
    expect(wedges(container, 'port')).toEqual(['clear', 'hidden', 'clear', 'thinned', 'clear']);
    expect(wedges(container, 'starboard')).toEqual(['clear']);
    const hatch = container
      .querySelector('[data-wedge="port hidden"]')
      ?.getAttribute('fill')
      ?.match(/#([^)]+)/)?.[1];
    expect(container.querySelector(`pattern[id="${hatch}"]`)).not.toBeNull();
  });

  it('breaks a long name over lines so that it finds room', () => {
    draw({ port: [{ ...strut, fromDeg: 2, toDeg: 46, by: 'leg of the starboard motor' }], starboard: [] });
    expect(screen.getByText('of the starboard motor')).toBeInTheDocument();
  });

  it('names every hidden or thinned part below the drawing, with a letter where it had no room', () => {
    draw({ port: [strut, sliver], starboard: [] });
    expect(screen.getByText(/port, 4° – 31° below level: hidden by the strut/)).toBeInTheDocument();
    const item = screen.getByText(/port, 36° – 38° below level: thinned by the skeg/);
    expect(item.textContent).toMatch(/^A /);
  });

  it('draws no fan for a side that is not wanted', () => {
    const { container } = draw({ port: null, starboard: [] });
    expect(wedges(container, 'port')).toEqual([]);
    expect(wedges(container, 'starboard')).toEqual(['clear']);
  });

  it('carries the offset, the depth and a scale', () => {
    draw({ port: [], starboard: [] });
    expect(screen.getByText('380 mm')).toBeInTheDocument();
    expect(screen.getByText('5 mm below the bottom')).toBeInTheDocument();
    expect(screen.getByText(/^1 : \d+$/)).toBeInTheDocument();
  });

  it('draws the torpedo at the stated scale', () => {
    const { container } = draw({ port: [], starboard: [] });
    const ratio = Number(screen.getByText(/^1 : \d+$/).textContent?.slice(4));
    const points = container.querySelector('[data-part="torpedo"]')?.getAttribute('points') ?? '';
    const xs = points.split(' ').map((pair) => Number(pair.split(',')[0]));
    // 82 mm on a screen of 96 pixels to the inch.
    expect((Math.max(...xs) - Math.min(...xs)) / (96 / 25.4)).toBeCloseTo(82 / ratio, 0);
  });

  it('follows the pointer that drags the sensor', () => {
    const moved = vi.fn();
    const { container } = render(
      <AsternDrawing scene={scene({ port: [], starboard: [] })} alternative="x" lengthText={lengthText} onMoveSensor={moved} />,
    );
    const handle = container.querySelector('circle.cursor-ew-resize') as SVGCircleElement;
    handle.setPointerCapture = () => {};
    const svg = handle.ownerSVGElement as SVGSVGElement;
    svg.getBoundingClientRect = () => ({ left: 0, top: 0, width: 640, height: 400 }) as DOMRect;
    fireEvent.pointerMove(handle, { pointerId: 1, clientX: 320, clientY: 100 });
    expect(moved).not.toHaveBeenCalled();
    fireEvent.pointerDown(handle, { pointerId: 1 });
    fireEvent.pointerMove(handle, { pointerId: 1, clientX: 320, clientY: 100 });
    expect(moved.mock.calls[0]?.[0]).toBeCloseTo(0, 6);
  });
});

describe('the boat from the side', () => {
  it('adds running trim and tilt to the attitude in the water', () => {
    render(
      <SideDrawing
        scene={sampleScene({ tiltDeg: -4 })}
        trimRad={(4 * Math.PI) / 180}
        title="From the side, at 18 kn"
        alternative="x"
        lengthText={lengthText}
      />,
    );
    expect(screen.getByText('boat 4.0° bow up, sensor level in the water')).toBeInTheDocument();
  });
});

describe('the boat from above', () => {
  it('hatches the strip of a side that is hidden from where the first part stands in it', () => {
    const { container } = render(<AboveDrawing scene={scene({ port: [strut], starboard: [] })} alternative="x" lengthText={lengthText} />);
    expect(container.querySelector('[data-strip="port hidden"]')).not.toBeNull();
    expect(container.querySelector('[data-strip="starboard clear"]')).not.toBeNull();
  });
});
