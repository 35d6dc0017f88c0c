// Pose and Jacobian as lean as Eigen's fixed sizes allow: joint axes turned to z beforehand, one sine and cosine a joint, no
// allocation in a call.
#pragma once
#include <cmath>
#include <eigen3/Eigen/Dense>
#include <kdl/frames.hpp>
#include <vector>

class Lean {
  struct Placed { Eigen::Matrix3d rotation; Eigen::Vector3d position; };
  std::vector<Placed> constants;
  std::vector<Eigen::Vector3d> axes, origins;
  Eigen::Matrix<double, 6, Eigen::Dynamic> whole;
  Eigen::Matrix3d frame = Eigen::Matrix3d::Identity();

  void place(const KDL::Frame &origin, const Eigen::Matrix3d &next) {
    Eigen::Matrix3d rotation;
    for (int i = 0; i < 3; i++) for (int j = 0; j < 3; j++) rotation(i, j) = origin.M(i, j);
    constants.push_back({frame.transpose() * rotation * next, frame.transpose() * Eigen::Vector3d(origin.p.x(), origin.p.y(), origin.p.z())});
    frame = next;
  }

public:
  void add(const KDL::Frame &origin, const KDL::Vector &axis) {
    Eigen::Vector3d z(axis.x(), axis.y(), axis.z());
    z.normalize();
    Eigen::Vector3d x = z.unitOrthogonal();
    Eigen::Matrix3d next;
    next << x, z.cross(x), z;
    place(origin, next);
    axes.emplace_back();
    origins.emplace_back();
  }
  void end(const KDL::Frame &tip) {
    place(tip, Eigen::Matrix3d::Identity());
    whole.resize(6, axes.size());
  }
  double ask(const double *q) {
    Eigen::Matrix3d r = Eigen::Matrix3d::Identity();
    Eigen::Vector3d p = Eigen::Vector3d::Zero();
    for (size_t i = 0; i < axes.size(); i++) {
      p.noalias() += r * constants[i].position;
      Eigen::Matrix3d placed = r * constants[i].rotation;
      double s = std::sin(q[i]), c = std::cos(q[i]);
      r.col(0) = c * placed.col(0) + s * placed.col(1);
      r.col(1) = c * placed.col(1) - s * placed.col(0);
      r.col(2) = placed.col(2);
      axes[i] = r.col(2);
      origins[i] = p;
    }
    p.noalias() += r * constants.back().position;
    Eigen::Matrix3d tip = r * constants.back().rotation;
    for (size_t i = 0; i < axes.size(); i++) {
      whole.col(i).head<3>() = axes[i].cross(p - origins[i]);
      whole.col(i).tail<3>() = axes[i];
    }
    return p.x() + whole(0, 0) + tip(0, 0);
  }
};
