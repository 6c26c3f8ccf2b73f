import type { GoalWish } from './goal-wish.ts';
import type { Aim } from './improve-aim.ts';
import { ApartAim } from './improve-apart.ts';
import { ChangesAim } from './improve-changes.ts';
import { DistinctAim } from './improve-distinct.ts';
import { EvenAim } from './improve-even.ts';
import type { Ground } from './improve-ground.ts';

export { ChangesAim };

/** One aim for each wish, in their order. */
export function aimsOf(ground: Ground, wishes: readonly GoalWish[]): Aim[] {
	return wishes.map(({ kind }) => {
		switch (kind) {
			case 'fewest-changes':
				return new ChangesAim(ground);
			case 'even-count':
			case 'even-area':
				return new EvenAim(ground, kind);
			case 'distinct':
				return new DistinctAim(ground);
			case 'same-ink-apart':
				return new ApartAim(ground);
		}
	});
}
