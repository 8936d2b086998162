#pragma once
#include <vector>

#include "dropfront/circuit/period_totals.hpp"

namespace dropfront::circuit {

/// What a walk asks of each thyristor (one entry each, network order).
struct ThyristorFigures {
  std::vector<double> peak_A;  ///< at the firing spike or later
  std::vector<double> mean_A;
  /// Least time from dropping out until the anode is positive again; infinite where that does not come.
  std::vector<double> turn_off_s;
};

ThyristorFigures thyristor_figures(const Walker& walker, const std::vector<Segment>& segments,
                                   const WalkTotals& totals);

}  // namespace dropfront::circuit
