import boathouse from '../../sessions/boathouse.json' with { type: 'json' };
import ferryLanding from '../../sessions/ferry-landing.json' with { type: 'json' };
import marketHall from '../../sessions/market-hall.json' with { type: 'json' };
import mountainHut from '../../sessions/mountain-hut.json' with { type: 'json' };
import orchardBarn from '../../sessions/orchard-barn.json' with { type: 'json' };
import villageLibrary from '../../sessions/village-library.json' with { type: 'json' };

/** The sample sessions as their files hold them: an installed program has no folder of them. */
export const SAMPLES: readonly { readonly title: string; readonly members: readonly unknown[] }[] = [
  boathouse,
  ferryLanding,
  marketHall,
  mountainHut,
  orchardBarn,
  villageLibrary,
];
