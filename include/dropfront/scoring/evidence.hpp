#pragma once
#include <memory>
#include <optional>
#include <string>

#include "dropfront/circuit/available_current.hpp"
#include "dropfront/circuit/transient.hpp"
#include "dropfront/scoring/design.hpp"
#include "dropfront/scoring/requirement.hpp"

namespace dropfront::scoring {

/// One solved operating point and what it was solved with.
struct OperatingPoint {
  std::string corner;
  double ambient_degC = 25;  ///< outside the enclosure
  double local_degC = 25;    ///< ambient + enclosure x input power
  std::string ends;
  std::string load;           ///< name for people
  double load_current_A = 0;  ///< at the output
  double rail_current_A = 0;  ///< adds Iq, leakage and rail loads
  circuit::ElementValues values;
  circuit::SteadyState state;
  double clamp_junction_degC = 25;
};

/// The lean corner's answer.
struct LeanAnswer {
  OperatingPoint cold, hot;                          ///< at the heaviest sustained load, at the deciding ends
  double available_cold_A = 0, available_hot_A = 0;  ///< rail current
  bool hot_decides = false;
  double margin_A = 0;  ///< at the output
  double margin_new_A = 0;
  double capability_A = 0;  ///< greatest sustained output current
  bool usable = false;
  std::string reason;
};

struct PlugInAnswer {
  circuit::Transient rail;   ///< high clamp curve, reservoir C min, ESR max: rail.transient
  circuit::Transient clamp;  ///< low-slope curve: the clamp's pulse
  circuit::Transient resistor_low, resistor_high;  ///< both ends of Rs
  double clamp_pulse_use = 0;  ///< fraction of the clamp's pulse rating used, absent rating: 0
  double peak_current_A = 0;
  bool usable = false;
  std::string reason;
};

/// The corners of one design on one supply, each solved once, when first asked for.
class Evidence {
 public:
  Evidence(const Design& design, const Requirement& requirement, const Supply& supply);
  ~Evidence();
  Evidence(const Evidence&) = delete;
  Evidence& operator=(const Evidence&) = delete;

  const Design& design() const;
  const Requirement& requirement() const;
  const Supply& supply() const;

  double required_rail_V() const;  ///< V_required
  const LeanAnswer& lean();
  const OperatingPoint& nominal();
  const OperatingPoint& rich_empty();      ///< the ambient with the greatest rail
  const OperatingPoint& rich_empty_hot();  ///< the same load at the high ambient, for powers
  const OperatingPoint& rich_loaded();     ///< the load with the greatest input power
  const OperatingPoint& standby();
  const OperatingPoint& standby_worst();
  const PlugInAnswer& plug_in();

 private:
  struct Impl;
  std::unique_ptr<Impl> impl_;
};

}  // namespace dropfront::scoring
