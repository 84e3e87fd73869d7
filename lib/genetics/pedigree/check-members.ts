import { GeneticsError } from '../genetics-error';
import type { PedigreeMember } from './pedigree-input';

/**
 * Checks a pedigree and adds parents that are named but not listed, as founders.
 * @throws {GeneticsError} 'evidence' for an animal listed twice, 'parent-sex' for a female sire or a male dam,
 *   'parent-order' for an animal among its own ancestors, 'probability' for sires or a retention that cannot be
 */
export function checkMembers(animals: readonly PedigreeMember[]): PedigreeMember[] {
  const byId = new Map<string, PedigreeMember>();
  for (const animal of animals) {
    if (byId.has(animal.id))
      throw new GeneticsError('evidence', animal.id, `"${animal.id}" is listed twice.`);
    byId.set(animal.id, animal);
  }
  const asParent = (id: string, sex: 'male' | 'female', young: string) => {
    const parent = byId.get(id);
    if (parent && parent.sex !== 'unknown' && parent.sex !== sex) {
      const role = sex === 'male' ? 'sire' : 'dam';
      throw new GeneticsError('parent-sex', young, `${id}, the ${role} of ${young}, is ${parent.sex}.`);
    }
    // Whoever has sired or laid has a known sex.
    if (!parent || parent.sex === 'unknown') byId.set(id, { ...(parent ?? { id }), sex });
  };
  for (const animal of animals) {
    if (animal.sires) {
      const chances = Object.values(animal.sires);
      const total = chances.reduce((a, b) => a + b, 0);
      if (chances.some((chance) => !(chance >= 0)) || Math.abs(total - 1) > 1e-9) {
        throw new GeneticsError(
          'probability',
          animal.id,
          `The chances of the sires of ${animal.id} add up to ${total}, not 1.`,
        );
      }
    }
    if (animal.retention !== undefined && !(animal.retention >= 0 && animal.retention <= 1)) {
      throw new GeneticsError(
        'probability',
        animal.id,
        `The retention of ${animal.id} is ${animal.retention}, not from 0 to 1.`,
      );
    }
    for (const id of siresOf(animal)) asParent(id, 'male', animal.id);
    if (animal.dam != null) asParent(animal.dam, 'female', animal.id);
  }
  refuseCircles(byId);
  return [...byId.values()];
}

function siresOf(animal: PedigreeMember): string[] {
  if (animal.parthenogenetic) return [];
  if (animal.sires) return Object.keys(animal.sires);
  return animal.sire == null ? [] : [animal.sire];
}

function refuseCircles(byId: ReadonlyMap<string, PedigreeMember>): void {
  const state = new Map<string, 'open' | 'done'>();
  for (const start of byId.keys()) {
    const path: { id: string; parents: string[] }[] = [];
    const enter = (id: string) => {
      if (state.get(id) === 'done') return;
      if (state.get(id) === 'open')
        throw new GeneticsError('parent-order', id, `"${id}" would be its own ancestor.`);
      state.set(id, 'open');
      const animal = byId.get(id);
      path.push({
        id,
        parents: animal ? [...siresOf(animal), ...(animal.dam == null ? [] : [animal.dam])] : [],
      });
    };
    enter(start);
    for (let top = path.at(-1); top; top = path.at(-1)) {
      const parent = top.parents.pop();
      if (parent !== undefined) enter(parent);
      else {
        state.set(top.id, 'done');
        path.pop();
      }
    }
  }
}
