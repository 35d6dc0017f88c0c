const SOURCES = [
  ['Angeles and López-Cajún 1992', 'Kinematic isotropy and the conditioning index of serial robotic manipulators. International Journal of Robotics Research 11(6), 560–571'],
  ['Chiaverini, Siciliano and Egeland 1994', 'Review of the damped least-squares inverse kinematics. IEEE Transactions on Control Systems Technology 2(2), 123–134'],
  ['Flacco, De Luca and Khatib 2015', 'Control of redundant robots under hard joint constraints: saturation in the null space. IEEE Transactions on Robotics 31(3), 637–654'],
  ['Klein and Huang 1983', 'Review of pseudoinverse control for use with kinematically redundant manipulators. IEEE Transactions on Systems, Man, and Cybernetics 13(2), 245–250'],
  ['Liégeois 1977', 'Automatic supervisory control of the configuration and behavior of multibody mechanisms. IEEE Transactions on Systems, Man, and Cybernetics 7(12), 868–871'],
  ['Maciejewski and Klein 1988', 'Numerical filtering for the operation of robotic manipulators through kinematically singular configurations. Journal of Robotic Systems 5(6), 527–552'],
  ['Nakamura and Hanafusa 1986', 'Inverse kinematic solutions with singularity robustness. ASME Journal of Dynamic Systems, Measurement, and Control 108(3), 163–171'],
  ['Richtmyer 1951', 'The evaluation of definite integrals, and a quasi-Monte-Carlo method based on the properties of algebraic numbers. Los Alamos report LA-1342'],
  ['Salisbury and Craig 1982', 'Articulated hands: force control and kinematic issues. International Journal of Robotics Research 1(1), 4–17'],
  ['Schönemann 1966', 'A generalized solution of the orthogonal Procrustes problem. Psychometrika 31(1), 1–10'],
  ['Siciliano, Sciavicco, Villani and Oriolo 2009', 'Robotics: Modelling, Planning and Control. Springer'],
  ['Sugihara 2011', 'Solvability-unconcerned inverse kinematics by the Levenberg–Marquardt method. IEEE Transactions on Robotics 27(5), 984–991'],
  ['Wampler 1986', 'Manipulator inverse kinematic solutions based on vector formulations and damped least-squares methods. IEEE Transactions on Systems, Man, and Cybernetics 16(1), 93–101'],
  ['Whitney 1969', 'Resolved motion rate control of manipulators and human prostheses. IEEE Transactions on Man-Machine Systems 10(2), 47–53'],
  ['Whitney 1972', 'The mathematics of coordinated control of prosthetic arms and manipulators. ASME Journal of Dynamic Systems, Measurement, and Control 94(4), 303–309'],
  ['Yoshikawa 1985', 'Manipulability of robotic mechanisms. International Journal of Robotics Research 4(2), 3–9'],
] as const

/** The publications that the methods come from. Titles and pages are cited from memory. */
export function SourceList() {
  return (
    <>
      <dl className="text-13 leading-5">
        {SOURCES.map(([who, where]) => (
          <div key={who} className="border-b border-hair py-1.5 tablet:grid tablet:grid-cols-[16rem_1fr] tablet:gap-4">
            <dt className="font-semibold">{who}</dt>
            <dd className="text-soft">{where}.</dd>
          </div>
        ))}
      </dl>
      <p className="label">Titles, volumes and pages are cited from memory.</p>
    </>
  )
}
