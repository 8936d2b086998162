#pragma once
#include <cstdint>
#include <optional>
#include <string>
#include <vector>

namespace dropfront::parts {

/// A rating the list may leave out. Absent means "not given", which is never a pass.
using Rating = std::optional<double>;

struct PriceBreak {
  std::int64_t quantity = 1;     ///< from this many pieces on
  std::int64_t price_micro = 0;  ///< price of one piece in millionths of the currency (integer sums)
};

/// What every part has besides its electrical values. Sizes are integers of a micrometre so that sums are
/// exact.
struct PartInfo {
  std::string name;                       ///< as in the list; families: '<row> <value>'
  std::string source;                     ///< where the row's figures come from
  std::optional<std::int64_t> length_um;  ///< footprint
  std::optional<std::int64_t> width_um;
  std::optional<std::int64_t> height_um;
  std::vector<PriceBreak> price_breaks;  ///< ascending quantity; empty: price not given
};

/// Price of one piece at a yearly `volume`: the greatest break <= volume, else the least given.
std::optional<std::int64_t> price_micro_at(const PartInfo& part, std::int64_t volume);

}  // namespace dropfront::parts
