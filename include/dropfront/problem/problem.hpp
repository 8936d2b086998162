#pragma once
#include <cstdint>
#include <deque>
#include <memory>
#include <optional>
#include <string>
#include <utility>
#include <vector>

#include "dropfront/parts/catalogue.hpp"
#include "dropfront/scoring/design.hpp"
#include "dropfront/scoring/requirement.hpp"

namespace dropfront::problem {

/// Parts that stand in no list: members of families and inline objects. Adding never moves a part.
struct DerivedParts {
  std::deque<parts::Dropper> droppers;
  std::deque<parts::Resistor> resistors;
  std::deque<parts::Clamp> clamps;
  std::deque<parts::Reservoir> reservoirs;
  std::deque<parts::Rectifier> rectifiers;
  std::deque<parts::OutputStage> output_stages;
  std::deque<parts::Varistor> varistors;
  std::deque<parts::Fuse> fuses;
  std::deque<parts::Thyristor> thyristors;
  std::deque<parts::Ceramic> ceramics;
};

/// What each slot offers after filters and series expansion, in part order (rows as read, then families by
/// ascending value, then inline objects). Pointers into the problem's catalogue and derived parts.
struct Offers {
  std::vector<const circuit::Arrangement*> arrangements;
  std::vector<const parts::Dropper*> droppers;
  std::vector<const parts::Resistor*> series_resistors;
  std::vector<const parts::Clamp*> clamps;
  std::vector<const parts::Reservoir*> reservoirs;
  std::vector<const parts::Rectifier*> rectifiers;
  std::vector<const parts::OutputStage*> output_stages;
  struct Chain {
    const parts::Resistor* element = nullptr;  ///< null: no discharge chain
    int count = 0;
  };
  std::vector<Chain> discharges;
  std::vector<const parts::Varistor*> varistors;  ///< a null entry: the slot may stay empty
  std::vector<const parts::Fuse*> fuses;
  std::vector<const parts::Ceramic*> ceramics;
  std::vector<const parts::Thyristor*> thyristors;
  std::vector<const parts::Resistor*> gate_resistors;
  int dropper_parallel = 1;              ///< equal droppers in parallel in every design, 1 or 2
  int series_resistor_split = 1;         ///< equal series resistors in series in every design, 1 or 2
  /// An arrangement with the parts only it has: one option of the search's first slot. In the order of
  /// `arrangements`; thyristor and gate resistor are null where the arrangement has none.
  struct Wiring {
    const circuit::Arrangement* arrangement = nullptr;
    const parts::Thyristor* thyristor = nullptr;
    const parts::Resistor* gate_resistor = nullptr;
  };
  std::vector<Wiring> wirings() const;
  bool varistor_before_resistor = true;  ///< line side of the series resistor, else behind it
};

/// A default the reader filled in, for `check` to print.
struct Default {
  std::string key;    ///< JSON pointer without the leading slash, dots between names: "output.tolerance"
  std::string value;  ///< as a person would write it
  std::string reason;
};

/// A file the problem was read from and the hash of its bytes (64-bit FNV-1a, 16 hex digits).
struct InputFile {
  std::string name;  ///< relative, as written in the problem (never an absolute path)
  std::string hash;
};

/// One problem, ready to search: everything a problem file says, one `vary` combination resolved.
struct Problem {
  std::string name;  ///< file name without .json, safe characters only
  std::string title;
  std::string source;  ///< the file as the user named it, for messages
  std::string text;    ///< the problem as JSON, defaults not filled in, this combination's values set
  std::shared_ptr<parts::Catalogue> catalogue;  ///< rows of the lists, as read
  std::shared_ptr<DerivedParts> derived;        ///< families and inline objects; both keep Offers alive
  scoring::Requirement requirement;
  Offers offers;
  std::vector<double> resolution;  ///< one an objective of the requirement: currency, W, mm2, A
  int top = 5;
  std::string effort = "normal";
  std::uint64_t seed = 1;
  std::vector<Default> defaults;
  std::vector<std::string> cautions;
  std::vector<InputFile> inputs;
};

/// One value of one `vary` key, e.g. {"output.voltage", "3.3 V"}.
using Variation = std::vector<std::pair<std::string, std::string>>;

/// A problem file: one problem, or a study with one problem a combination (first key slowest).
struct ProblemFile {
  std::string name;
  std::string title;
  bool study = false;
  std::vector<Problem> problems;
  std::vector<Variation> variations;  ///< one a problem when `study`
};

/// Reads and validates. `sets` are "key=value" from --set, keys as dotted names ("limits.standby_power").
/// Throws values::InputError (file, JSON pointer with line:column, what was found, what is allowed).
ProblemFile read_problem_file(const std::string& path, const std::vector<std::string>& sets = {});

/// Reads a design file against the problem's lists; inline parts are added to the problem's
/// derived parts. `slots` of the problem are ignored: any part of the lists may be named.
scoring::Design read_design_file(const std::string& path, Problem& problem);

}  // namespace dropfront::problem
