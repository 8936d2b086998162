#pragma once
#include <stdexcept>
#include <string>

namespace dropfront::values {

/// A mistake in something a person wrote. Thrown by the readers only (never by scoring or search), caught
/// once in app, exit status 2. The message is one sentence: what was found, what is allowed, what was meant.
class InputError : public std::runtime_error {
 public:
  /// `file`: as the user named it; `place`: "line:column" or a JSON pointer, may be empty.
  InputError(const std::string& file, const std::string& place, const std::string& message)
      : std::runtime_error(file + (place.empty() ? "" : ":" + place) + ": " + message) {}
};

}  // namespace dropfront::values
