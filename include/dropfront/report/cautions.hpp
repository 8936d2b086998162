#pragma once
#include <string>
#include <vector>

namespace dropfront::report {

/// What every output says of itself and of the circuit, whatever the result.
const std::vector<std::string>& standing_cautions();

/// The standing cautions followed by `own`, each once.
std::vector<std::string> with_standing_cautions(const std::vector<std::string>& own);

}  // namespace dropfront::report
