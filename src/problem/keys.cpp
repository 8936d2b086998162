#include "dropfront/problem/keys.hpp"

#include <algorithm>

namespace dropfront::problem {

bool KeySet::knows(std::string_view key) const {
  return std::find(required.begin(), required.end(), key) != required.end() ||
         std::find(optional.begin(), optional.end(), key) != optional.end();
}

std::vector<std::string> KeySet::all() const {
  std::vector<std::string> both = required;
  both.insert(both.end(), optional.begin(), optional.end());
  return both;
}

namespace keys {

const KeySet problem{
    "problem",
    {"title", "mains", "output", "parts"},
    {"$schema", "surroundings", "connection", "limits", "derating", "volume", "currency", "placement_cost",
     "slots", "objectives", "resolution", "vary", "missing_ratings", "top", "effort", "seed"}};
const KeySet supply{"supply", {"voltage", "frequency"}, {"name", "harmonics", "phases"}};
const KeySet spread{"spread", {"low", "nominal", "high"}, {}};
const KeySet harmonic{"harmonic", {"order", "percent"}, {"phase_deg"}};
const KeySet output{"output", {"voltage", "loads"}, {"tolerance", "standby_load", "start_load"}};
const KeySet load{"load", {"name", "current"}, {"at", "min_voltage", "for", "every"}};
const KeySet surroundings{
    "surroundings",
    {},
    {"ambient", "enclosure", "life", "pollution_degree", "material_group", "max_height", "ripple_life"}};
const KeySet ambient{"ambient", {}, {"low", "nominal", "high", "mean_over_life"}};
const KeySet connection{"connection", {}, {"kind", "plug_ins", "chatter"}};
const KeySet limits{"limits",
                    {},
                    {"standby_power", "current_margin", "start_time", "discharge", "surge", "fast_burst",
                     "dips", "series_rated"}};
const KeySet discharge_rule{"discharge rule", {"voltage", "after"}, {"not_below"}};
const KeySet surge{"surge", {"voltage"}, {"source"}};
const KeySet dip{"dip", {"residual", "cycles"}, {}};
const KeySet derating{
    "derating", {}, {"resistor.power", "reservoir.voltage", "dropper.voltage", "clamp.power", "junction"}};
const KeySet slots{"slots",
                   {},
                   {"arrangement", "output_stage", "dropper", "series_resistor", "clamp", "reservoir",
                    "discharge", "rectifier", "varistor", "fuse", "ceramic", "thyristor", "gate_resistor"}};
const KeySet resolution{"resolution", {}, {"cost", "standby_loss", "board_area", "current_margin"}};
const KeySet range{"range", {}, {"min", "max"}};
const KeySet design{"design",
                    {"arrangement", "series_resistor", "clamp", "reservoir", "rectifier", "output_stage"},
                    {"dropper", "discharge", "varistor", "fuse", "ceramic", "thyristor", "gate_resistor"}};

namespace {

// One set a slot; a family needs a value that comes in preferred numbers, so rectifiers, output stages,
// varistors, fuses, thyristors and ceramics have none.
const std::vector<KeySet> slot_sets{
    {"output_stage", {}, {"only", "where", "except"}},
    {"dropper", {}, {"only", "where", "except", "series", "from", "to", "like", "parallel"}},
    {"series_resistor", {}, {"only", "where", "except", "series", "from", "to", "like", "split"}},
    {"clamp", {}, {"only", "where", "except", "series", "from", "to", "like"}},
    {"reservoir", {}, {"only", "where", "except", "series", "from", "to", "like"}},
    {"discharge", {}, {"only", "where", "except", "series", "from", "to", "like", "count", "optional"}},
    {"rectifier", {}, {"only", "where", "except"}},
    {"varistor", {}, {"only", "where", "except", "optional", "place"}},
    {"fuse", {}, {"only", "where", "except", "optional"}},
    {"ceramic", {}, {"only", "where", "except", "optional"}},
    {"thyristor", {}, {"only", "where", "except"}},
    {"gate_resistor", {}, {"only", "where", "except", "series", "from", "to", "like"}},
};

}  // namespace

const KeySet* slot(std::string_view name) {
  for (const KeySet& set : slot_sets) {
    if (set.object == name) return &set;
  }
  return nullptr;
}

const std::vector<const KeySet*>& every() {
  static const std::vector<const KeySet*> sets = [] {
    std::vector<const KeySet*> all{&problem,        &supply,  &spread,       &harmonic,   &output,
                                   &load,           &ambient, &limits,       &connection, &surge,
                                   &discharge_rule, &dip,     &surroundings, &derating,   &slots,
                                   &resolution,     &range,   &design};
    for (const KeySet& set : slot_sets) all.push_back(&set);
    return all;
  }();
  return sets;
}

}  // namespace keys

std::string either(const std::vector<std::string>& words) {
  std::string out;
  for (std::size_t i = 0; i < words.size(); ++i) {
    if (i > 0) out += i + 1 == words.size() ? " or " : ", ";
    out += words[i];
  }
  return out;
}

}  // namespace dropfront::problem
