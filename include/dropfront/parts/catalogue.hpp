#pragma once
#include <string>
#include <vector>

#include "dropfront/parts/clamp.hpp"
#include "dropfront/parts/dropper.hpp"
#include "dropfront/parts/output_stage.hpp"
#include "dropfront/parts/protection.hpp"
#include "dropfront/parts/rectifier.hpp"
#include "dropfront/parts/reservoir.hpp"
#include "dropfront/parts/resistor.hpp"

namespace dropfront::parts {

/// All rows of one or more lists, in the order read. Pointers into the vectors are stable once loaded.
struct Catalogue {
  std::vector<Dropper> droppers;
  std::vector<Resistor> resistors;
  std::vector<Clamp> clamps;
  std::vector<Reservoir> reservoirs;
  std::vector<Rectifier> rectifiers;
  std::vector<OutputStage> output_stages;
  std::vector<Varistor> varistors;
  std::vector<Fuse> fuses;
  std::vector<Thyristor> thyristors;
  std::vector<Ceramic> ceramics;
};

/// Reads every known CSV file of `folder` (a missing file is an empty list; a folder with none is an error)
/// and appends to `catalogue`. Throws values::InputError naming file, line, column and value; also on a part
/// name used twice within a kind.
void read_parts_folder(const std::string& folder, Catalogue& catalogue);

}  // namespace dropfront::parts
