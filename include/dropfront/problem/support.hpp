#pragma once
#include <string>
#include <string_view>
#include <vector>

#include "dropfront/circuit/arrangement.hpp"
#include "dropfront/problem/cursor.hpp"

namespace dropfront::problem {

/// What this version can do is decided by what is registered, in one place: a check in
/// scoring::check_table(), an arrangement in circuit::arrangements().

/// Whether a check of that id, or with that prefix ending in '.', is registered.
bool checks(std::string_view id);

/// Reads an arrangement's name. Names that are known but not registered are refused with "not offered by
/// this version".
const circuit::Arrangement* read_arrangement(const Cursor& cursor);

/// Says that a protective part is offered or present while no registered check looks at it.
void caution_unchecked(const std::string& key, bool present, bool checked,
                       std::vector<std::string>& cautions);

}  // namespace dropfront::problem
