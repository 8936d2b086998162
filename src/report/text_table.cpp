#include "dropfront/report/text_table.hpp"

#include <algorithm>
#include <numeric>

namespace dropfront::report {

namespace {

bool starts_character(char c) { return (static_cast<unsigned char>(c) & 0xC0) != 0x80; }

/// Bytes of the first `count` characters.
std::size_t prefix_bytes(std::string_view text, int count) {
  for (std::size_t i = 0; i < text.size(); ++i)
    if (starts_character(text[i]) && count-- == 0) return i;
  return text.size();
}

}  // namespace

int display_width(std::string_view text) {
  return static_cast<int>(std::count_if(text.begin(), text.end(), starts_character));
}

std::string clipped(std::string_view text, int width) {
  if (display_width(text) <= width) return std::string(text);
  return std::string(text.substr(0, prefix_bytes(text, std::max(0, width - 2)))) + "..";
}

std::string wrapped(std::string_view text, std::string_view first) {
  const std::string blank(display_width(first), ' ');
  const int room = kTextWidth - static_cast<int>(blank.size());
  std::string out;
  std::string line(first);
  int used = 0;
  const auto break_line = [&] {
    out += line + '\n';
    line = blank;
    used = 0;
  };
  while (!text.empty()) {
    const auto space = text.find(' ');
    std::string_view word = text.substr(0, space);
    text.remove_prefix(space == std::string_view::npos ? text.size() : space + 1);
    if (used > 0 && used + 1 + display_width(word) > room) break_line();
    while (display_width(word) > room) {
      const auto bytes = prefix_bytes(word, room);
      line += word.substr(0, bytes);
      word.remove_prefix(bytes);
      break_line();
    }
    if (used > 0) line += ' ';
    line += word;
    used += display_width(word) + (used > 0 ? 1 : 0);
  }
  return out + line + '\n';
}

TextTable::TextTable(const std::vector<std::string>& headings, int indent) : indent_(indent) {
  for (const auto& heading : headings) {
    right_.push_back(heading.starts_with('>'));
    headings_.push_back(right_.back() ? heading.substr(1) : heading);
  }
}

void TextTable::row(std::vector<std::string> cells) {
  cells.resize(headings_.size());
  rows_.push_back({std::move(cells), ""});
}

void TextTable::note(const std::string& text, int indent) {
  rows_.back().notes += wrapped(text, std::string(indent, ' '));
}

std::vector<int> TextTable::widths() const {
  std::vector<int> widths;
  for (std::size_t column = 0; column < headings_.size(); ++column) {
    int width = display_width(headings_[column]);
    for (const auto& row : rows_) width = std::max(width, display_width(row.cells[column]));
    widths.push_back(width);
  }
  const int gaps = 2 * (static_cast<int>(widths.size()) - 1);
  const int excess = std::accumulate(widths.begin(), widths.end(), indent_ + gaps) - kTextWidth;
  if (excess > 0) {
    int widest = -1;
    for (int i = 0; i < static_cast<int>(widths.size()); ++i)
      if (!right_[i] && (widest < 0 || widths[i] > widths[widest])) widest = i;
    if (widest >= 0) widths[widest] = std::max(4, widths[widest] - excess);
  }
  return widths;
}

std::string TextTable::line(const std::vector<std::string>& cells, const std::vector<int>& widths) const {
  std::string text(indent_, ' ');
  for (std::size_t i = 0; i < cells.size(); ++i) {
    if (i > 0) text += "  ";
    const std::string cell = clipped(cells[i], widths[i]);
    const std::string blank(std::max(0, widths[i] - display_width(cell)), ' ');
    text += right_[i] ? blank + cell : cell + blank;
  }
  text.erase(text.find_last_not_of(' ') + 1);
  return text + '\n';
}

std::string TextTable::text() const {
  const auto width = widths();
  std::string text = line(headings_, width);
  for (const auto& row : rows_) text += line(row.cells, width) + row.notes;
  return text;
}

}  // namespace dropfront::report
