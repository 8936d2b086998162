#pragma once
#include <string_view>

namespace dropfront::scoring {

/// The formula of a check, by its id: its symbols are the names of the figures the check carries, so that a
/// reader can work the value out again. Empty for an id without one; a test holds every check of the table to
/// one. A new check adds its line here.
std::string_view check_formula(std::string_view id);

}  // namespace dropfront::scoring
