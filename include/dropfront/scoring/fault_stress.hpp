#pragma once
#include <string>
#include <vector>

#include "dropfront/circuit/transient.hpp"
#include "dropfront/scoring/faults.hpp"

namespace dropfront::scoring {

/// What an observed period says of each element.
class FaultFigures {
 public:
  explicit FaultFigures(const circuit::Network& network);
  void add(const circuit::Moment& moment);
  /// Greatest voltage against a branch's direction.
  double reverse_V(std::size_t branch) const { return reverse_V_[branch]; }
  double input_current_Arms() const;

 private:
  std::vector<double> reverse_V_;
  std::vector<double> legs_;  ///< diodes of a branch: two of a bridge share its voltage
  double square_A2s_ = 0;
  double time_s_ = 0;
};

/// Every figure of a part beside its rating, in the order of the slots: mean powers over `duration_s`,
/// reverse voltages, the rail on reservoir and output stage.
std::vector<FaultStress> fault_stresses(const Design& design, const circuit::Network& network,
                                        const circuit::Transient& period, const FaultFigures& figures,
                                        double duration_s);

/// Fusible resistors by the multiple of the power at which they open, fuses by the multiple of 2.1 times
/// their rating (at which a fuse opens within half an hour; IEC 60127 as restated, copy not kept).
std::vector<std::string> opening_parts(const Design& design, const FaultRow& row);

}  // namespace dropfront::scoring
