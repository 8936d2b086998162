#include "dropfront/scoring/clamp_trace.hpp"

#include <algorithm>

namespace dropfront::scoring {

namespace {
constexpr double kJoined = 0.08;      // share of the time before that one stretch may last
constexpr double kShortest_s = 1e-7;  // finer than any time constant of a plug-in pulse
}  // namespace

ClampTrace::ClampTrace(const circuit::Network& network, const circuit::Curve* forward, Way way)
    : forward_(forward), part_(network.branches.size(), 0) {
  circuit::Node first = -1;
  for (std::size_t i = 0; i < network.branches.size(); ++i) {
    if (network.branches[i].owner != circuit::Owner::clamp) continue;
    if (first < 0) first = network.branches[i].a;
    const bool there = network.branches[i].a == first;
    part_[i] = way == Way::either || there == (way == Way::there) ? 1 : -1;
  }
}

void ClampTrace::add(const circuit::Moment& moment) {
  double power_W = 0;
  double through_A = 0, forward_A = 0;
  // Back to back, the branches of one direction hold the part in breakdown and the other's forward drop.
  for (std::size_t i = 0; i < part_.size() && i < moment.branch_A.size(); ++i) {
    if (part_[i] == 0) continue;
    if (part_[i] < 0) {
      forward_A += moment.branch_A[i];
      continue;
    }
    power_W += moment.branch_A[i] * moment.branch_V[i];
    through_A += moment.branch_A[i];
  }
  if (forward_ != nullptr) {
    power_W -= through_A * (forward_->threshold_V + forward_->slope_ohm * through_A);
    if (forward_A > 0) power_W += forward_A * (forward_->threshold_V + forward_->slope_ohm * forward_A);
  }
  energy_J_ += std::max(0.0, power_W) * moment.step_s;
  open_.duration_s += moment.step_s;
  if (open_.duration_s >= std::max(kShortest_s, kJoined * elapsed_s_)) {
    open_.power_W = energy_J_ / open_.duration_s;
    elapsed_s_ += open_.duration_s;
    steps_.push_back(open_);
    open_ = {};
    energy_J_ = 0;
  }
}

std::vector<circuit::PowerStep> ClampTrace::take() {
  if (open_.duration_s > 0) {
    open_.power_W = energy_J_ / open_.duration_s;
    steps_.push_back(open_);
    open_ = {};
  }
  return std::move(steps_);
}

}  // namespace dropfront::scoring
