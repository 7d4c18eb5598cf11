import type { Price } from './yard.ts';

/** Money, in whatever the yard list is written in: "43.20". */
export function moneyText(amount: number): string {
  return amount.toFixed(2);
}

const PER: Readonly<Record<Price['per'], string>> = {
  piece: 'a piece',
  foot: 'a foot',
  'board foot': 'a board foot',
};

/** What a price goes by, all its decimals: "1.35 a board foot". */
export function rateText({ amount, per }: Price): string {
  const decimals = String(amount).split('.')[1]?.length ?? 0;
  return `${decimals > 2 ? String(amount) : moneyText(amount)} ${PER[per]}`;
}
