import { describe, expect, it } from 'vitest';
import { valueAt, withValueAt } from '../../../src/form/body';
import { itemsOf, withItemAdded, withoutItem } from '../../../src/form/items';
import type { Field } from '../../../shared/contract/field';

describe('a value at a path', () => {
  it('is found in objects and lists, and is undefined where the path leads nowhere', () => {
    const body = { parts: [{ stops: 1 }, { stops: 2 }], iso: 100 };
    expect(valueAt(body, ['parts', 1, 'stops'])).toBe(2);
    expect(valueAt(body, ['parts', 7, 'stops'])).toBeUndefined();
    expect(valueAt(body, ['iso', 'deeper'])).toBeUndefined();
  });

  it('is changed in a copy, the body itself staying as it was', () => {
    const body = { from: { aperture: 8 }, to: { aperture: 4 } };
    const next = withValueAt(body, ['to', 'aperture'], 'f/2');
    expect(next).toEqual({ from: { aperture: 8 }, to: { aperture: 'f/2' } });
    expect(body.to.aperture).toBe(4);
    expect(next.from).toBe(body.from);
  });

  it('makes the containers on its way', () => {
    expect(withValueAt({}, ['limits', 'isoMax'], 800)).toEqual({ limits: { isoMax: 800 } });
    expect(withValueAt({}, ['parts', 0, 'stops'], 1)).toEqual({ parts: [{ stops: 1 }] });
  });

  it('is taken out by undefined: a name from its object, an item from its list', () => {
    expect(withValueAt({ a: 1, b: 2 }, ['a'], undefined)).toEqual({ b: 2 });
    expect(withValueAt({ parts: [1, 2, 3] }, ['parts', 1], undefined)).toEqual({ parts: [1, 3] });
  });
});

describe('items', () => {
  const item: Field = {
    name: 'item',
    kind: 'number',
    required: true,
    title: 'Gun',
    advanced: false,
    minimum: 1,
  };
  const many: Field = { ...item, name: 'guns', kind: 'oneOrMany', item };

  it('of a one-or-many field are its value or its values', () => {
    expect(itemsOf(undefined)).toEqual([]);
    expect(itemsOf(50)).toEqual([50]);
    expect(itemsOf([50, 40])).toEqual([50, 40]);
  });

  it('are added like the last, else like the example, else as little as the item takes', () => {
    expect(withItemAdded(many, 50, 30)).toEqual([50, 50]);
    expect(withItemAdded(many, undefined, 30)).toEqual([30]);
    expect(withItemAdded(many, undefined, undefined)).toEqual([1]);
    const group: Field = { ...many, item: { ...item, kind: 'group' } };
    expect(withItemAdded(group, [], undefined)).toEqual([{}]);
  });

  it('leave a single value behind, or nothing where nothing is required', () => {
    expect(withoutItem(many, [50, 40], 0)).toBe(40);
    expect(withoutItem({ ...many, required: false }, [50], 0)).toBeUndefined();
    expect(withoutItem({ ...many, kind: 'list' }, [50], 0)).toEqual([]);
  });
});
