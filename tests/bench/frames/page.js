import { createElement } from 'react';
import { createRoot } from 'react-dom/client';

import { LatticeViewer } from '#client/scene/viewer.tsx';

import { rockSaltCell } from './rock-salt.js';

const radii = { 'Mg+2': 0.72, 'O-2': 1.4 };
const nothing = () => undefined;
const nextFrame = () => new Promise((resolve) => window.requestAnimationFrame(resolve));
const stageElement = () => document.querySelector('[data-frame]');
const drawnFrames = () => Number(stageElement()?.getAttribute('data-frame') ?? 0);

function mount(counts) {
  createRoot(document.getElementById('stage')).render(
    createElement(
      'div',
      { style: { position: 'absolute', inset: 0, display: 'flex', flexDirection: 'column' } },
      createElement(LatticeViewer, {
        cell: rockSaltCell(...counts),
        ionicRadiusA: (key) => radii[key],
        selectedIonIds: [],
        onSelectionChange: nothing,
        litPair: null,
        pins: [],
        repeat: [1, 1, 1],
        ionScale: 0.55,
        signMarks: false,
        view: null,
        describeIon: () => ({ title: '', detail: '' }),
        theme: 'light',
      }),
    ),
  );
}

function send(type, x) {
  const at = { pointerId: 1, pointerType: 'mouse', button: 0, clientX: x, clientY: 300 };
  stageElement().dispatchEvent(new window.PointerEvent(type, { ...at, bubbles: true }));
}

/** Turns the block by dragging for `count` frames; time from one drawn frame to the next, ms. */
window.measureFrames = async (counts, count) => {
  mount(counts);
  while (drawnFrames() === 0) {
    await nextFrame();
  }
  // Nothing captures the pointer: these events come from no device.
  stageElement().setPointerCapture = nothing;
  send('pointerdown', 0);
  const times = [];
  let last = 0;
  for (let step = 0; step < count + 10; step += 1) {
    const before = drawnFrames();
    send('pointermove', step * 3);
    while (drawnFrames() === before) {
      await nextFrame();
    }
    const now = window.performance.now();
    // The first frames compile and fill tables.
    if (step >= 10) {
      times.push(now - last);
    }
    last = now;
  }
  send('pointerup', 0);
  const canvas = document.querySelector('canvas');
  return {
    times,
    renderer: stageElement().getAttribute('data-renderer'),
    width: canvas.width,
    height: canvas.height,
  };
};
