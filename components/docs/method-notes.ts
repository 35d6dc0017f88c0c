/** A test that proves a method: its file and its title, word for word. */
export interface Proof {
  readonly file: string
  readonly title: string
}

/** What somebody who chooses a method has to know besides its formula. */
export interface MethodNote {
  /** As requests and answers name it, or the method itself. */
  readonly name: string
  readonly units: string
  readonly use: string
  readonly cost: string
  readonly caution: string
  readonly proofs: readonly Proof[]
}

const kinematics = (name: string, ...titles: string[]): Proof[] => titles.map((title) => ({ file: `tests/lib/kinematics/${name}.test.ts`, title }))
const reference = (name: string, title: string): Proof => ({ file: `tests/reference/${name}.test.ts`, title })

/** The notes of each section of /docs/methods, by its id. */
export const METHOD_NOTES: Readonly<Record<string, readonly MethodNote[]>> = {
  'forward-kinematics': [
    {
      name: 'Product of joint transforms',
      units: 'Joint values in rad or m; positions in m; quaternions without unit. As chosen in "units".',
      use: 'Whenever the place of a link is wanted. Ask for further links in one request rather than chain by chain.',
      cost: 'One sine and cosine a turning joint, and a product of transforms; linear in the joints.',
      caution: 'Limits are reported and not enforced. The pose is that of the model: the arm itself is as good as its calibration.',
      proofs: [
        ...kinematics('forward-kinematics', 'FK8 gives the golden pose of the 7R arm', 'agrees with the product of matrix exponentials of mathjs', 'keeps a proper rotation over 5000 joints'),
        reference('random-trees', 'have the same poses'),
      ],
    },
  ],
  jacobian: [
    {
      name: 'Geometric Jacobian',
      units: 'Rows in m/s and rad/s over columns in rad/s or m/s: m/rad, m/m, rad/rad. As chosen in "units".',
      use: 'To relate small motions, or forces by its transpose, at the tool point.',
      cost: 'One cross product a joint after the pose; linear in the joints.',
      caution: 'It belongs to one reference point: give "tool", or the linear rows are those of the flange.',
      proofs: [
        ...kinematics('jacobian', 'J5 gives the golden Jacobian of the 7R arm', 'J6 gives the velocity of the tool point and not that of the base origin', 'is the derivative of the pose, on random arms with prismatic joints, mimics and a tool'),
        reference('random-trees', 'have the same Jacobians'),
      ],
    },
  ],
  measures: [
    {
      name: 'singularValues, rank, manipulability, conditionNumber',
      units: 'SI, linear rows divided by the characteristic length (m). Manipulability has the unit of their product.',
      use: 'To compare poses of one arm for one task; the condition number to see how unevenly directions move.',
      cost: 'A decomposition of components x n: the dearest part of a Jacobian question; linear in the joints.',
      caution: 'All depend on the characteristic length where a task mixes m and rad. The numbers of two arms compare only at the same one.',
      proofs: [
        ...kinematics(
          'measures',
          'J1 gives the singular values of the planar 2R arm, and l1·l2·|sin q2| as manipulability (Yoshikawa 1985)',
          'finds the isotropic pose of a 2R arm with l1 = √2·l2, whatever the first joint does (Salisbury & Craig 1982)',
          'agrees with the singular values of ml-matrix on random arms, tasks and frames',
        ),
        reference('numpy', 'has the same singular values'),
      ],
    },
    {
      name: 'translationalSingularValues, rotationalSingularValues',
      units: 'SI: m/s of the tool, and rad/s, for a unit of joint rates.',
      use: 'To judge speed and turning of the tool apart, without choosing a characteristic length.',
      cost: 'Two more decompositions of at most three rows each.',
      caution: 'Each looks away from the other part: full rank in both does not mean full rank of the task.',
      proofs: kinematics('measures', 'gives the singular values of the linear and the angular rows, each by itself', 'leaves a part empty that the task does not have'),
    },
  ],
  'null-space': [
    {
      name: 'Canonical basis, projector, lost directions',
      units: 'SI; orthonormal columns over joint rates in rad/s and m/s alike.',
      use: 'To move an arm while its tool stands still, or to see which freedom a symmetric tool leaves.',
      cost: 'The decomposition and n² numbers of the projector; the basis of a thousand joints takes more than 10 ms in one piece.',
      caution: 'Where rotary and sliding joints mix, orthonormal depends on their units. The basis may jump where the pivot changes: use alignTo along a path.',
      proofs: [
        ...kinematics(
          'null-space',
          'gives the closed-form null vector of the planar 3R arm, whose length is the manipulability (Cauchy & Binet)',
          'does not let rounding choose between two components of equal size',
          'keeps the defining properties of the projector and the basis on random arms and tasks',
        ),
        reference('numpy', 'has the same projector'),
      ],
    },
    {
      name: 'alignTo',
      units: 'SI, n x k.',
      use: 'Along a path, with the basis of the configuration before.',
      cost: 'A decomposition of k x k, small beside the rest.',
      caution: 'The answer depends on the path that led there; send the configurations in order.',
      proofs: kinematics('null-space', 'keeps a basis of four directions continuous along a path on which the canonical one jumps', 'changes neither the space nor the projector'),
    },
  ],
  inverse: [
    {
      name: 'truncated',
      units: 'tolerance: relative to the largest singular value.',
      use: 'Offline, or where exact motion matters and singular poses are kept away from by other means.',
      cost: 'The least of all at easy poses: a triangular factorisation instead of singular values.',
      caution: 'Rates grow without bound near a singular pose and then jump to nothing at the tolerance.',
      proofs: kinematics('inverse', 'drops each direction whose singular value is at most the tolerance times the largest, and delivers nothing of it'),
    },
    {
      name: 'damped',
      units: 'damping λ: SI, in the unit of a singular value.',
      use: 'Where smooth rates matter more than accuracy, everywhere.',
      cost: 'As truncated.',
      caution: 'Errs at every pose, easy ones included: work it off with a closed loop.',
      proofs: [
        ...kinematics('resolve-rates', 'gives the damped rates of the planar 3R arm, what they achieve and what is lost (Nakamura & Hanafusa 1986, from memory)'),
        reference('random-trees', 'have the same weighted damped rates, to 1e-14 times the condition of the damped system'),
      ],
    },
    {
      name: 'adaptive-damped',
      units: 'threshold ε and maxDamping λmax: SI, in the unit of a singular value.',
      use: 'The choice where nothing is known: exact at easy poses, bounded at hard ones.',
      cost: 'Singular values where the smallest may be under the threshold, else as truncated.',
      caution: 'Near a singular pose it damps all directions a little, not only the one that is lost.',
      proofs: kinematics('inverse', 'is continuous where it sets in', 'damps from 0.02 down, by at most 0.05, where nothing is said'),
    },
    {
      name: 'filtered',
      units: 'threshold and damping: SI, in the unit of a singular value.',
      use: 'Where the directions that are still there must stay exact beside one that vanishes.',
      cost: 'Singular values at hard poses.',
      caution: 'Where singular values cross, the damped direction changes with them.',
      proofs: kinematics('inverse', 'fades to nothing at its threshold, so that the rates do not jump there'),
    },
    {
      name: 'jointWeights',
      units: 'What a unit of each rate costs, squared; only their ratios count.',
      use: 'To spare heavy or coarse joints, or to level sliding joints (m) with turning ones (rad).',
      cost: 'n multiplications.',
      caution: 'The projector becomes oblique: a posture is then pursued in the weighted sense. A stiff joint may make a direction count as lost.',
      proofs: kinematics('joint-weights', 'agree with W⁻¹Jᵀ(JW⁻¹Jᵀ + λ²I)⁻¹ as mathjs computes it, damped and not', 'make the projector I − J_W⁺J: idempotent, oblique, and silent in the task'),
    },
  ],
  objectives: [
    {
      name: 'posture',
      units: 'gain in 1/s; posture in the units of the configuration.',
      use: 'To hold an elbow or to lead an arm out of a singular pose.',
      cost: 'n operations, and the projection.',
      caution: 'A posture whose difference lies along a row of the Jacobian moves nothing; the diagnosis says so.',
      proofs: kinematics('resolve-rates', 'moves towards a posture without moving the tool', 'projects with the undamped inverse, so that a damped task is not disturbed by the posture'),
    },
    {
      name: 'mid-range',
      units: 'gain in 1/s, SI; never converted.',
      use: 'To stay away from joint limits where nothing better is known.',
      cost: 'n operations, and the projection.',
      caution: 'It is soft: it does not keep the limits. Joints without both bounds take no part.',
      proofs: kinematics('objectives', 'is the derivative of that measure over all joints of the chain', 'leaves joints without both bounds, or with no range between them, alone'),
    },
    {
      name: 'manipulability',
      units: 'gain in 1/s, SI; the gradient has the unit of manipulability over rad or m.',
      use: 'To keep clear of singular poses along a task.',
      cost: 'The derivative of the Jacobian by every joint: n² instead of n.',
      caution: 'At a singular pose there is no gradient and nothing is asked. It may lead a joint to its limit.',
      proofs: kinematics('manipulability-gradient', 'is l1·l2·cos q2 with the sign of sin q2 for a planar 2R arm at q2 = %s', 'leads the self-motion of the 7R arm to higher manipulability, as an objective'),
    },
  ],
  limits: [
    {
      name: 'scale',
      units: 'rad/s or m/s by joint, times the derating; scale and secondaryScale without unit.',
      use: 'The choice where nothing is said: the tool keeps its direction and slows down.',
      cost: 'A search in the plane of both factors, only where a limit binds.',
      caution: 'The tool arrives later than asked: look at scale, and at rate-limited in the diagnosis.',
      proofs: kinematics('rate-scaling', 'gives up the secondary motion before it slows the task', 'finds what a fine grid over both factors finds, and never less'),
    },
    {
      name: 'saturate',
      units: 'As scale; accelerations in rad/s² or m/s², dt in s.',
      use: 'For redundant arms at speed: other joints take over for one at its limit.',
      cost: 'A further solution for each joint that saturates.',
      caution: 'Send accelerations, dt and the rates of the period before, or rates may change at once.',
      proofs: kinematics('saturate-rates', 'never exceeds a bound, never slows the task more than even scaling does, and keeps its direction', 'never refuses motion back inside a limit that is violated'),
    },
    {
      name: 'report',
      units: 'As scale.',
      use: 'To see what would be asked of the joints.',
      cost: 'None.',
      caution: 'The rates may exceed every limit: not for a machine.',
      proofs: kinematics('resolve-rates', 'says the rates as they are under report, whatever the limits'),
    },
  ],
  'closed-loop': [
    {
      name: 'references with gains',
      units: 'gains in 1/s; errors in m and rad.',
      use: 'Whenever a path is followed: integration and damping leave errors that only feedback removes.',
      cost: 'One rotation vector.',
      caution: 'Stable for gain · dt below 2 and without overshoot below 1. A far goal asks for high speed: the limits then decide.',
      proofs: kinematics('closed-loop-twist', 'leads a discrete loop to its goal: gain 5 at 10 ms leaves 0.95^100 of the error after a second, near e^-5', 'turns the short way round, and at half a turn by the sign rule of the quaternion'),
    },
  ],
  'inverse-kinematics': [
    {
      name: 'Levenberg and Marquardt from several starts',
      units: 'Tolerances in the length and the angle unit.',
      use: 'To place a tool; with seeds near the answer where the arm should not change its posture.',
      cost: 'Tens of steps for an attempt, each about a joint-rates answer; up to "attempts" of them. 10 s a request.',
      caution: 'Not converging is an answer. Neighbouring targets may get distant configurations; the motion between is not examined.',
      proofs: kinematics(
        'inverse-kinematics',
        'finds a configuration, within the limits, for every pose that some configuration has',
        'stays near its seed: a goal a little off is reached in a few steps and a little motion',
        'says unreachable of a goal beyond the arm, with the configuration that comes nearest',
      ),
    },
  ],
  diagnosis: [
    {
      name: 'Codes and sentences',
      units: 'direction: a unit twist in the frame of the task, SI.',
      use: 'Read it with every answer that moves something: a zero answer may be a lost direction.',
      cost: 'None at easy poses; at a singular pose the search for a posture that frees the arm.',
      caution: 'It speaks of this instant and this model. It is not a safety function.',
      proofs: kinematics(
        'diagnose',
        'stays put without an objective, and with the suggested one leaves the pose and follows, never further off than the damping lets it',
        'does not promise it for a self-motion that leaves the elbow stretched',
        'counts a direction as lost from less than 1 % delivered, and no sooner',
      ),
    },
  ],
}
