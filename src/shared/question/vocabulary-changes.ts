import type { VocabularyEntry } from './vocabulary-entry.ts';

/** Changes a question names, of kiln, burner and gas: what was tried, or is thought of. */
export const CHANGE_VOCABULARY: readonly VocabularyEntry[] = [
  {
    means: ['change:gas-more'],
    says: [
      'more gas|pressure',
      'turn gas|pressure|regulator up',
      'turn up gas|pressure|regulator',
      'gas|pressure up',
      'increase|raise|higher gas|pressure',
    ],
  },
  {
    means: ['change:gas-less'],
    says: [
      'less gas|pressure',
      'turn gas|pressure|regulator down|back',
      'turn down gas|pressure|regulator',
      'reduce|lower gas|pressure',
    ],
  },
  {
    means: ['change:air-more'],
    says: [
      'more air|primary',
      'more primary air',
      'open air|primary up?',
      'open primary air',
      'air open more',
    ],
  },
  {
    means: ['change:air-less'],
    says: ['less air', 'less primary air', 'close|shut|reduce air|primary', 'close primary air'],
  },
  {
    means: ['change:jet-cleaned-or-changed'],
    says: [
      'clean|clear|unblock|change|replace|swap|new|drill|bigger|larger|different jet|nozzle|orifice|injector',
      'jet clean|change|replace',
      'clean burner',
    ],
  },
  {
    means: ['change:burner-bigger'],
    says: ['bigger|larger|stronger burner', 'more powerful burner', 'upgrade burner'],
  },
  {
    means: ['change:burner-added'],
    says: [
      'second|another|extra|additional burner',
      'add burner',
      'two burner|burners',
      'twin burner|burners',
    ],
  },
  {
    means: ['change:burner-more-sweeping'],
    says: [
      'burner .. angle|angled|tangent|tangential|sideways|swirl',
      'angle burner',
      'swirl|sweep|sweeping flame|burner',
      'aim|point|turn|direct|tilt|set burner .. along|round|around|sideways|tangentially|tangent',
      'burner aim|point|turn|direct|tilt .. along|round|around|sideways|tangentially|tangent',
      'tangentially',
      'burner sweep|swirl',
      'burner round|around wall',
      'tangential',
    ],
  },
  {
    means: ['change:burner-straighter'],
    says: ['burner straight|straighter in?', 'aim burner|straight straight? in|at'],
  },
  {
    means: ['change:setback-longer'],
    says: [
      'burner further|farther back|away|out',
      'move|pull|set burner back|away|out',
      'set|setback further|longer back',
      'longer setback',
      'setback',
    ],
  },
  {
    means: ['change:setback-shorter'],
    says: ['burner closer|nearer in|to', 'move|push burner closer|in|nearer', 'shorter setback'],
  },
  {
    means: ['change:fuel-changed'],
    says: [
      'change|switch|swap fuel',
      'switch|change from? to propane|butane',
      'different fuel|gas',
    ],
  },
  {
    means: ['change:cylinder-bigger'],
    says: [
      '@bigger (gas|propane|butane)? cylinder|tank|bottle',
      'second|two|another|twin cylinder|tank|cylinders|tanks',
      'manifold',
    ],
  },
  {
    means: ['change:flue-more-open'],
    says: [
      'open|opening|widen|enlarge flue|damper|chimney|vent',
      '@bigger|wider flue|vent|chimney',
      'flue|damper .. open|wider|bigger',
      'open up flue|damper',
      'uncover flue',
    ],
  },
  {
    means: ['change:flue-more-covered'],
    says: [
      'cover|close|closing|shut|block|choke|partly|half flue|damper|chimney|vent',
      'flue|damper .. cover|close|shut|half|partly|in',
      'damper in|down',
      'smaller flue|vent',
    ],
  },
  {
    means: ['change:leaks-sealed'],
    says: [
      'seal|plug|fill|stop leak|leaks|gap|gaps|crack|cracks|lid|door',
      'seal up? lid|door|gaps|leaks',
      'seal|plug|fill|stop|block lid|door|hat gap|gaps|leak|leaks|joint',
      'seal|plug|fill|stop|block gap|gaps|leak|leaks around|round|at|in|under|by lid|door|hat|kiln',
    ],
  },
  {
    means: ['change:floor-insulated'],
    says: [
      'insulate floor|base',
      'insulated floor|base',
      'insulation under|on floor|kiln|base',
      'fibre under kiln|floor|shelf',
      'hollow block|blocks',
    ],
  },
  {
    means: ['change:lining-thicker'],
    says: [
      'thicker lining|fibre|blanket|insulation|walls',
      'second|another|extra|double|more layer? fibre|blanket|insulation|lining',
      'more insulation|fibre',
    ],
  },
  {
    means: ['change:kiln-dried'],
    says: ['dry|dried kiln out?', 'dry out kiln', 'kiln dry|dried out'],
  },
  {
    means: ['change:wind-shelter'],
    says: [
      'windbreak',
      'wind break|shelter|shield|screen|baffle',
      'shelter',
      'baffle',
      'windshield',
      'out of wind',
      'shield from? wind',
    ],
  },
  {
    means: ['change:flame-path-cleared'],
    says: ['clear flame path', 'clear path', 'move pots|shelf|ware away|out of? flame|burner'],
  },
  {
    means: ['change:shelf-lighter'],
    says: ['lighter|thinner shelf|shelves', 'silicon carbide shelf'],
  },
  {
    means: ['change:shelf-raised'],
    says: [
      'raise|raised|lift|higher shelf',
      'shelf higher|raised|up',
      'taller|longer post|posts|prop|props',
    ],
  },
];
