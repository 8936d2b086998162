#pragma once
#include <string>
#include <string_view>
#include <vector>

#include "dropfront/report/part_columns.hpp"
#include "dropfront/scoring/design.hpp"

namespace dropfront::report {

/// One filled slot of a design.
struct SlotPart {
  std::string_view slot;  ///< as in problem and design files
  const parts::PartInfo* info = nullptr;
  int counted = 1;    ///< equal parts the design file counts itself: in series (discharge chain, series
                      ///< resistor) or in parallel (dropper)
  int placed = 1;     ///< pieces on the board
  std::string value;  ///< for people: "680 nF 275 V", "2 x 470 kohm"
  Columns electrical;
};

/// All slot names in the order of files and tables, arrangement first.
const std::vector<std::string_view>& slot_names();

/// The filled slots of a design in that order, the arrangement left out.
std::vector<SlotPart> design_slots(const scoring::Design& design);

/// Values for people, one a kind: "680 nF 275 V", "47 ohm", "12 V", "220 uF 25 V", "linear 5 V", ...
std::string short_value(const parts::Dropper& part);
std::string short_value(const parts::Resistor& part);
std::string short_value(const parts::Clamp& part);
std::string short_value(const parts::Reservoir& part);
std::string short_value(const parts::Rectifier& part);
std::string short_value(const parts::OutputStage& part);
std::string short_value(const parts::Varistor& part);
std::string short_value(const parts::Fuse& part);
std::string short_value(const parts::Thyristor& part);
std::string short_value(const parts::Ceramic& part);

}  // namespace dropfront::report
