#include "dropfront/values/text_file.hpp"

#include <filesystem>
#include <fstream>
#include <sstream>

#include "dropfront/values/input_error.hpp"

namespace dropfront::values {
namespace {

/// Length of the valid UTF-8 sequence at the front of `text`, 0 when there is none (RFC 3629 table).
std::size_t sequence_length(std::string_view text) {
  const auto byte = [&](std::size_t i) -> unsigned { return i < text.size() ? (unsigned char)text[i] : 0; };
  const auto continues = [&](std::size_t i, unsigned low = 0x80, unsigned high = 0xbf) {
    return i < text.size() && byte(i) >= low && byte(i) <= high;
  };
  const unsigned first = byte(0);
  if (first < 0x80) return 1;
  if (first >= 0xc2 && first <= 0xdf) return continues(1) ? 2 : 0;
  if (first >= 0xe0 && first <= 0xef) {
    const unsigned low = first == 0xe0 ? 0xa0 : 0x80;   // no overlong form
    const unsigned high = first == 0xed ? 0x9f : 0xbf;  // no surrogate
    return continues(1, low, high) && continues(2) ? 3 : 0;
  }
  if (first >= 0xf0 && first <= 0xf4) {
    const unsigned low = first == 0xf0 ? 0x90 : 0x80;
    const unsigned high = first == 0xf4 ? 0x8f : 0xbf;
    return continues(1, low, high) && continues(2) && continues(3) ? 4 : 0;
  }
  return 0;
}

}  // namespace

std::optional<std::size_t> first_invalid_utf8(std::string_view text) {
  for (std::size_t i = 0; i < text.size();) {
    const std::size_t length = sequence_length(text.substr(i));
    if (length == 0) return i;
    i += length;
  }
  return std::nullopt;
}

std::string line_and_column(std::string_view text, std::size_t offset) {
  std::size_t line = 1;
  std::size_t column = 1;
  for (std::size_t i = 0; i < offset && i < text.size(); ++i) {
    if (text[i] == '\n') {
      ++line;
      column = 1;
    } else if ((static_cast<unsigned char>(text[i]) & 0xc0) != 0x80) {  // not a continuation byte
      ++column;
    }
  }
  return std::to_string(line) + ":" + std::to_string(column);
}

std::string read_text_file(const std::string& path) {
  std::error_code code;
  const auto status = std::filesystem::status(path, code);
  if (!std::filesystem::exists(status)) throw InputError(path, "", "there is no such file");
  if (std::filesystem::is_directory(status)) throw InputError(path, "", "is a folder, a file is wanted");
  std::ifstream file(path, std::ios::binary);
  std::ostringstream content;
  content << file.rdbuf();
  if (!file.is_open() || file.bad()) throw InputError(path, "", "cannot be read");
  std::string text = content.str();
  if (text.starts_with("\xef\xbb\xbf")) text.erase(0, 3);
  if (const auto bad = first_invalid_utf8(text)) {
    throw InputError(path, line_and_column(text, *bad), "holds a byte that is not UTF-8 text");
  }
  return text;
}

}  // namespace dropfront::values
