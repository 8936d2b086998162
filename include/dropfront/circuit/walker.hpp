#pragma once
#include <memory>
#include <string>
#include <vector>

#include "dropfront/circuit/segment.hpp"
#include "dropfront/circuit/symmetric_eigen.hpp"

namespace dropfront::circuit {

/// Carries the capacitor voltages of one network through time, conduction mode by conduction mode, each in
/// closed form. Modes are derived when first met and kept.
class Walker {
 public:
  /// Check fault() first.
  explicit Walker(Network network);

  const std::string& fault() const { return fault_; }
  void fail(std::string why) { fault_ = std::move(why); }
  const Network& network() const { return network_; }
  const Topology& topology() const { return topology_; }

  /// Advances `x` from time `from_s` to `to_s`. Appends the segments to `segments` (cleared first).
  /// False: no consistent mode or too many crossings; fault() says which.
  bool walk(double from_s, double to_s, StateVector& x, std::vector<Segment>& segments);

  /// Which thyristors the next walk finds latched, and which the last one left so (bits as in the mask).
  void set_latched(ConductionMask latched) { latched_ = latched; }
  ConductionMask latched() const { return latched_; }
  ConductionMask thyristor_bits() const;

  /// d x(end) / d x(start) along `segments`: the product of the segments' own exponentials, and of the jumps
  /// of the field where a thyristor changes state (at branches the field is continuous).
  SmallMatrix sensitivity(const std::vector<Segment>& segments) const;

  /// Advances d x / d x(start) and d x / d(load current) over a segment's first `length_s`.
  void carry(const Segment& segment, double length_s, SmallMatrix& by_start, StateVector& by_load) const;

  /// Advances the same derivatives over the border between two segments: nothing at branches and loads; where
  /// a thyristor fires or drops out, I + (f+ - f-)·n^T/(n^T·f- + dg/dt) with the guard g and its gradient n.
  void cross(const Segment& before, const Segment& after, SmallMatrix& by_start, StateVector& by_load) const;

  /// The guard whose crossing ended `before`, thyristors first. False: none did.
  struct GuardRows {
    const ModalRow* row = nullptr;
    const ForcedRow* forced = nullptr;
  };
  bool crossed_guard(const Segment& before, const Segment& after, GuardRows& rows) const;

  /// Changes the first load's current; the modes are kept and shifted.
  void set_load(double current_A);

 private:
  const ConductionMode& mode(ConductionMask mask);
  /// The conduction mode that fits these capacitor voltages at this time.
  bool find_mode(double time_s, const StateVector& x, ConductionMask& mask);
  double worst_violation_V(const ConductionMode& mode, double time_s, const StateVector& x, int& bit);

  Network network_;
  Topology topology_;
  std::string fault_;
  std::vector<std::unique_ptr<ConductionMode>> modes_;
  ConductionMask last_start_ = 0;
  ConductionMask latched_ = 0;
  TonePhase phase_;
};

}  // namespace dropfront::circuit
