import type { Section } from '#shared/contracts/index.ts';

/** Ordered to finished size, for sawn softwood regularised on its edges: common practice. */
const breadths: readonly [number, number][] = [
  [38, 35],
  [50, 47],
  [75, 72],
];
const depths: readonly [number, number][] = [
  [100, 97],
  [125, 120],
  [150, 145],
  [175, 170],
  [200, 195],
  [225, 220],
  [250, 245],
  [300, 295],
];
const lengths = [2400, 3000, 3600, 4200, 4800, 5400, 6000];
/** Made up: so much for a cubic metre, and half a cent more for each millimetre of depth. */
const PRICE_OF_VOLUME = 540;

function section([orderedB, b]: [number, number], [orderedH, h]: [number, number]): Section {
  const price = (orderedB * orderedH * PRICE_OF_VOLUME) / 1e6 + orderedH * 0.005;
  return {
    id: `${orderedB}x${orderedH}`,
    nominal: { b: orderedB, h: orderedH },
    actual: { b, h },
    // The deepest ones are cut to order.
    lengths: orderedH >= 300 ? [] : lengths,
    grades: orderedB === 75 ? ['C24'] : ['C16', 'C24'],
    pricePerMetre: Math.round(price * 100) / 100,
  };
}

/** The demo firm's yard: a stock list with made-up prices. */
export const demoStock = {
  title: 'Yard at Sallow Lane (invented)',
  note: 'Regularised softwood: ordered by the nominal size, finished to the actual one. Prices and grades held are made up.',
  invented: true,
  units: 'metric' as const,
  currency: 'EUR',
  sections: breadths.flatMap((b) => depths.map((h) => section(b, h))),
};
