#include "dropfront/report/text_table.hpp"

#include <algorithm>
#include <numeric>

namespace dropfront::report {

namespace {

bool starts_character(char c) { return (static_cast<unsigned char>(c) & 0xC0) != 0x80; }

constexpr int kLongestWord = 44;  ///< words up to this stay whole in a table

int longest_word(std::string_view text) {
  int longest = 0;
  while (!text.empty()) {
    const auto space = text.find(' ');
    longest = std::max(longest, display_width(text.substr(0, space)));
    text.remove_prefix(space == std::string_view::npos ? text.size() : space + 1);
  }
  return std::min(longest, kLongestWord);
}

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

std::vector<std::string> broken(std::string_view text, int room) {
  std::vector<std::string> lines(1);
  while (!text.empty()) {
    const auto space = text.find(' ');
    std::string_view word = text.substr(0, space);
    text.remove_prefix(space == std::string_view::npos ? text.size() : space + 1);
    int used = display_width(lines.back());
    if (used > 0 && used + 1 + display_width(word) > room) {
      lines.emplace_back();
      used = 0;
    }
    while (display_width(word) > room) {
      const auto bytes = prefix_bytes(word, room);
      lines.back() += word.substr(0, bytes);
      word.remove_prefix(bytes);
      lines.emplace_back();
    }
    if (used > 0) lines.back() += ' ';
    lines.back() += word;
  }
  return lines;
}

std::string wrapped(std::string_view text, std::string_view first) {
  const std::string blank(display_width(first), ' ');
  std::string out;
  for (const auto& line : broken(text, kTextWidth - static_cast<int>(blank.size())))
    out += (out.empty() ? std::string(first) : blank) + line + '\n';
  return out;
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
  std::vector<int> widths, least;
  for (std::size_t column = 0; column < headings_.size(); ++column) {
    int width = display_width(headings_[column]);
    int word = longest_word(headings_[column]);
    for (const auto& row : rows_) {
      width = std::max(width, display_width(row.cells[column]));
      word = std::max(word, longest_word(row.cells[column]));
    }
    widths.push_back(width);
    least.push_back(word);
  }
  const int gaps = 2 * (static_cast<int>(widths.size()) - 1);
  for (;;) {
    const int excess = std::accumulate(widths.begin(), widths.end(), indent_ + gaps) - kTextWidth;
    int widest = -1;
    for (int i = 0; i < static_cast<int>(widths.size()); ++i)
      if (!right_[i] && widths[i] > least[i] && (widest < 0 || widths[i] > widths[widest])) widest = i;
    if (excess <= 0 || widest < 0) return widths;
    --widths[widest];  // the widest ones come down together
  }
}

std::string TextTable::line(const std::vector<std::string>& cells, const std::vector<int>& widths) const {
  std::vector<std::vector<std::string>> columns;
  std::size_t height = 1;
  for (std::size_t i = 0; i < cells.size(); ++i) {
    columns.push_back(display_width(cells[i]) <= widths[i] ? std::vector<std::string>{cells[i]}
                                                           : broken(cells[i], widths[i]));
    height = std::max(height, columns.back().size());
  }
  std::string text;
  for (std::size_t at = 0; at < height; ++at) {
    std::string one(indent_, ' ');
    for (std::size_t i = 0; i < cells.size(); ++i) {
      if (i > 0) one += "  ";
      const std::string cell = at < columns[i].size() ? columns[i][at] : "";
      const std::string blank(std::max(0, widths[i] - display_width(cell)), ' ');
      one += right_[i] ? blank + cell : cell + blank;
    }
    one.erase(one.find_last_not_of(' ') + 1);
    text += one + '\n';
  }
  return text;
}

std::string TextTable::text() const {
  const auto width = widths();
  std::string text = line(headings_, width);
  for (const auto& row : rows_) text += line(row.cells, width) + row.notes;
  return text;
}

}  // namespace dropfront::report
