// The same questions asked of Orocos KDL in C++, timed inside this program and driven line by line, so that its turns can
// alternate with those of the product. Reads from standard input:
//   chain <n>            then n lines: 12 numbers of the joint's placement (row-major 3 x 4), 3 of its axis; then 12 of the tip
//   configurations <k>   then k lines of n numbers
//   <question> <count>   answers the nanoseconds a call took, over `count` calls, and a sum that keeps the work alive
// A chain is built as a reader of URDF builds it: each joint turns about an axis given in the frame of the one before.
#include <chrono>
#include <iostream>
#include <kdl/chain.hpp>
#include <kdl/chainfksolverpos_recursive.hpp>
#include <kdl/chainiksolvervel_pinv_nso.hpp>
#include <kdl/chainiksolvervel_wdls.hpp>
#include <kdl/chainjnttojacsolver.hpp>
#include <memory>
#include <string>
#include <vector>

#include "lean.hpp"

using namespace KDL;

static Frame read_frame() {
  double t[12];
  for (double &x : t) std::cin >> x;
  return Frame(Rotation(t[0], t[1], t[2], t[4], t[5], t[6], t[8], t[9], t[10]), Vector(t[3], t[7], t[11]));
}

struct Solvers {
  Chain chain;
  Lean lean;
  unsigned n;
  std::unique_ptr<ChainFkSolverPos_recursive> position;
  std::unique_ptr<ChainJntToJacSolver> jacobian;
  std::unique_ptr<ChainIkSolverVel_wdls> damped;
  std::unique_ptr<ChainIkSolverVel_pinv_nso> spare;
  JntArray rates;
  Jacobian whole;
  Frame pose;
  Twist twist = Twist(Vector(0.1, -0.05, 0.08), Vector(0.1, 0.2, -0.1));

  explicit Solvers(const Chain &of, const Lean &fixed) : chain(of), lean(fixed), n(of.getNrOfJoints()), rates(n), whole(n) {
    position.reset(new ChainFkSolverPos_recursive(chain));
    jacobian.reset(new ChainJntToJacSolver(chain));
    damped.reset(new ChainIkSolverVel_wdls(chain));
    damped->setLambda(0.05);
    spare.reset(new ChainIkSolverVel_pinv_nso(chain));
    JntArray optimum(n), weights(n);
    for (unsigned i = 0; i < n; i++) { optimum(i) = 0.3; weights(i) = 1; }
    spare->setOptPos(optimum);
    spare->setWeights(weights);
    spare->setAlpha(1.0);
  }

  double ask(const std::string &question, const JntArray &q) {
    if (question == "lean") return lean.ask(q.data.data());
    position->JntToCart(q, pose);
    if (question == "fk") return pose.p.x();
    if (question == "fk-jacobian") { jacobian->JntToJac(q, whole); return pose.p.x() + whole.data(0, 0); }
    if (question == "damped") { damped->CartToJnt(q, twist, rates); return pose.p.x() + rates(0); }
    if (question == "spare") { spare->CartToJnt(q, twist, rates); return pose.p.x() + rates(0); }
    return 0;
  }
};

int main() {
  std::ios::sync_with_stdio(false);
  std::unique_ptr<Solvers> solvers;
  std::vector<JntArray> configurations;
  std::string word;
  while (std::cin >> word) {
    unsigned count;
    std::cin >> count;
    if (word == "chain") {
      Chain chain;
      Lean lean;
      for (unsigned i = 0; i < count; i++) {
        Frame origin = read_frame();
        double x, y, z;
        std::cin >> x >> y >> z;
        lean.add(origin, Vector(x, y, z));
        chain.addSegment(Segment(Joint("joint", origin.p, origin.M * Vector(x, y, z), Joint::RotAxis), origin));
      }
      Frame tip = read_frame();
      lean.end(tip);
      chain.addSegment(Segment(Joint("tip", Joint::None), tip));
      solvers.reset(new Solvers(chain, lean));
    } else if (word == "configurations") {
      configurations.assign(count, JntArray(solvers->n));
      for (JntArray &q : configurations)
        for (unsigned i = 0; i < solvers->n; i++) std::cin >> q(i);
    } else {
      double kept = 0;
      auto start = std::chrono::steady_clock::now();
      for (unsigned i = 0, at = 0; i < count; i++) {
        kept += solvers->ask(word, configurations[at]);
        if (++at == configurations.size()) at = 0;
      }
      std::chrono::duration<double, std::nano> took = std::chrono::steady_clock::now() - start;
      std::cout << took.count() / count << " " << kept << std::endl;
    }
  }
}
