#pragma once
#include <string>
#include <vector>

#include "dropfront/parts/columns.hpp"

namespace dropfront::parts {

/// The columns every kind has: part, sizes, prices, source.
const std::vector<Column>& common_columns();

/// "output stage": the kind's name as running text.
std::string kind_phrase(Kind kind);
/// "an output stage".
std::string kind_with_article(Kind kind);

}  // namespace dropfront::parts
