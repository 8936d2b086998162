#include "dropfront/report/result.hpp"

namespace dropfront::report {

bool proven(const Result& result) { return result.proof && result.proof->complete; }

const Entry* find_entry(const Result& result, int number) {
  for (const auto* list : {&result.front, &result.extras})
    for (const auto& entry : *list)
      if (entry.number == number) return &entry;
  return nullptr;
}

}  // namespace dropfront::report
