#pragma once
#include <string>
#include <vector>

#include "dropfront/problem/document.hpp"
#include "dropfront/problem/problem.hpp"

namespace dropfront::problem {

/// Puts `value` at the dotted way `key` below `root`, replacing what stands there; missing objects on the way
/// are made. A list entry is named by its index from 0 or by its "name". Keys that hold a dot themselves
/// ("resistor.power" in derating) are found as written. Throws std::invalid_argument with the reason.
void put(Node& root, const std::string& key, const Node& value);

/// "key=value" of --set into `root`. The value is read as JSON where it is a number, true, false, a list, an
/// object or a quoted text, and is plain text otherwise. A key that the problem varies is varied no longer.
/// Throws values::InputError.
void apply_set(Node& root, const std::string& assignment, const std::string& file);

struct Combination {
  Node root;  ///< the problem with this combination's values set and "vary" gone
  Variation variation;
};

/// One combination a member of the product of the "vary" lists, first key slowest; one in all, with an empty
/// variation, where the problem varies nothing. Throws values::InputError.
std::vector<Combination> expand_study(const Node& root, const std::string& file);

}  // namespace dropfront::problem
