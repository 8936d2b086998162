#pragma once
#include <string_view>

namespace dropfront::app {

/// A commented problem file to begin from, complete and searchable beside the shipped parts lists.
std::string_view start_file();

}  // namespace dropfront::app
