#pragma once
#include <cstddef>
#include <optional>
#include <string>
#include <string_view>

namespace dropfront::values {

/// Whole content of a text file, a UTF-8 byte order mark removed. Throws InputError: not there, a folder, not
/// readable, not UTF-8 (with line:column).
std::string read_text_file(const std::string& path);

/// Byte offset of the first byte that is not part of valid UTF-8 (RFC 3629).
std::optional<std::size_t> first_invalid_utf8(std::string_view text);

/// "line:column" of a byte offset, both from 1; the column counts characters, not bytes.
std::string line_and_column(std::string_view text, std::size_t offset);

}  // namespace dropfront::values
