#include "dropfront/report/json_writer.hpp"

#include <cmath>

#include "dropfront/values/number_text.hpp"

namespace dropfront::report {

std::string exact_text(double value) { return std::isfinite(value) ? values::number_text(value) : "null"; }

std::string JsonWriter::quoted(std::string_view text) {
  static constexpr std::string_view kHex = "0123456789abcdef";
  std::string out = "\"";
  for (const char c : text) {
    const auto code = static_cast<unsigned char>(c);
    if (c == '"' || c == '\\') {
      out += '\\';
      out += c;
    } else if (c == '\n') {
      out += "\\n";
    } else if (c == '\t') {
      out += "\\t";
    } else if (code < 0x20) {
      out += "\\u00";
      out += kHex[code >> 4];
      out += kHex[code & 15];
    } else {
      out += c;
    }
  }
  return out + '"';
}

void JsonWriter::new_line() {
  text_ += '\n';
  text_.append(2 * levels_.size(), ' ');
}

void JsonWriter::separate() {
  if (after_key_) {
    after_key_ = false;
    return;
  }
  if (levels_.empty()) return;
  const bool first = levels_.back().empty;
  levels_.back().empty = false;
  if (!first) text_ += flat() ? ", " : ",";
  if (!flat()) new_line();
}

void JsonWriter::key(std::string_view name) {
  separate();
  text_ += quoted(name);
  text_ += ": ";
  after_key_ = true;
}

void JsonWriter::item(std::string_view text) {
  separate();
  text_ += text;
}

void JsonWriter::open(char bracket, Layout layout) {
  separate();
  text_ += bracket;
  levels_.push_back({flat() ? Layout::flat : layout, true});
}

void JsonWriter::close(char bracket) {
  const Level level = levels_.back();
  levels_.pop_back();
  if (level.layout == Layout::lines && !level.empty) new_line();
  text_ += bracket;
}

void JsonWriter::document(std::string_view json) {
  while (!json.empty() && (json.back() == '\n' || json.back() == ' ')) json.remove_suffix(1);
  separate();
  for (const char c : json) {
    if (c == '\n')
      new_line();
    else
      text_ += c;
  }
}

std::string JsonWriter::take() {
  text_ += '\n';
  return std::move(text_);
}

}  // namespace dropfront::report
