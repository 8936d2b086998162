#pragma once
#include <cstddef>
#include <string>

namespace dropfront::problem {

/// Bytes of the sequence that begins with this lead byte, in text already known to be valid UTF-8.
/// Source: RFC 3629 section 3.
std::size_t utf8_length(char lead);

/// Appends the sequence of one code point (0 to 10FFFF, no surrogate).
void append_utf8(std::string& out, unsigned code);

}  // namespace dropfront::problem
