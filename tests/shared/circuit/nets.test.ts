import { describe, expect, test } from 'vitest';
import { findNets } from '#shared/circuit/nets';
import { drawingWith, drawn, wired } from '../../support/draw';

const resistor = (id: string, x: number, y: number, ref = id) =>
  drawn(id, 'resistor', x, y, { ref, values: { resistance: 1e3 } });
const named = (id: string, kind: 'supply' | 'net-name', net: string, x: number, y: number) =>
  drawn(id, kind, x, y, { values: { net } });

describe('terminals are one net', () => {
  test('when a wire joins them', () => {
    const { netOf } = findNets(
      drawingWith([resistor('R1', 0, 0), resistor('R2', 200, 0)], [wired('w', 'R1.b', 'R2.a')]),
    );
    expect(netOf.get('R1/b')).toBe(netOf.get('R2/a'));
    expect(netOf.get('R1/a')).not.toBe(netOf.get('R1/b'));
  });

  test('when they touch, also after a turn', () => {
    const turned = drawn('R2', 'resistor', 30, 30, {
      ref: 'R2',
      values: { resistance: 1 },
      place: { x: 30, y: 30, turn: 1, flip: false },
    });
    // Turned once clockwise, a terminal 30 px above the middle lies 30 px to its right, the other to its left: on R1.b.
    const { netOf } = findNets(drawingWith([resistor('R1', 0, 0), turned]));
    expect(netOf.get('R2/b')).toBe(netOf.get('R1/b'));
  });

  test('when their names are equal, however far apart', () => {
    const { netOf } = findNets(
      drawingWith([
        resistor('R1', 0, 0),
        resistor('R2', 900, 0),
        named('a', 'net-name', 'x', 0, -30),
        named('b', 'net-name', 'x', 900, -30),
      ]),
    );
    expect(netOf.get('R1/a')).toBe('x');
    expect(netOf.get('R2/a')).toBe('x');
  });
});

describe('a net is named', () => {
  test('by ground first, then a supply, then the first name, with a word that names meet', () => {
    const parts = [
      resistor('R1', 0, 0),
      named('n2', 'net-name', 'beta', 0, -30),
      named('n1', 'net-name', 'alpha', 0, -30),
      named('s', 'supply', 'vdd', 0, -30),
    ];
    expect(findNets(drawingWith(parts)).namesMeet).toEqual([{ kept: 'vdd', names: ['vdd', 'alpha', 'beta'] }]);
    const grounded = findNets(drawingWith([...parts, drawn('g', 'ground', 0, -30)]));
    expect(grounded.netOf.get('R1/a')).toBe('gnd');
    expect(grounded.namesMeet[0]?.kept).toBe('gnd');
  });

  test('from its lowest terminal when nobody named it, so that moving or reordering never renames it', () => {
    const parts = [resistor('x', 0, 0, 'R10'), resistor('y', 200, 0, 'R2')];
    const wires = [wired('w', 'x.b', 'y.a')];
    expect(findNets(drawingWith(parts, wires)).netOf.get('x/b')).toBe('R2.a');
    expect(findNets(drawingWith([...parts].reverse(), wires)).netOf.get('x/b')).toBe('R2.a');
  });

  test('apart from a net that somebody gave the same name', () => {
    const { netOf, nets } = findNets(
      drawingWith([resistor('R1', 0, 0), resistor('R2', 500, 0), named('n', 'net-name', 'R1.a', 500, -30)]),
    );
    expect(netOf.get('R2/a')).toBe('R1.a');
    expect(netOf.get('R1/a')).toBe('R1.a_2');
    expect(nets.get('R1.a')?.named).toBe(true);
  });
});
