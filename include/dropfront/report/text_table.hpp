#pragma once
#include <string>
#include <string_view>
#include <vector>

namespace dropfront::report {

/// Widest line of a text for people.
inline constexpr int kTextWidth = 100;

/// Characters of a UTF-8 text (code points, which is columns for the letters used here).
int display_width(std::string_view text);

/// `text` broken at spaces into lines of at most `room` characters. A word too long for a line is split.
std::vector<std::string> broken(std::string_view text, int room);

/// The same in lines of at most kTextWidth, each ended by a line break; the first begins with `first`, the
/// others with as many spaces.
std::string wrapped(std::string_view text, std::string_view first = "");

/// `text` cut to `width` characters, ended by ".." when something is cut.
std::string clipped(std::string_view text, int width);

/// Columns under headings, two spaces apart, as narrow as their cells allow. No trailing spaces.
class TextTable {
 public:
  /// A heading that begins with '>' sets its column flush right (the '>' is not printed).
  explicit TextTable(const std::vector<std::string>& headings, int indent = 2);
  void row(std::vector<std::string> cells);
  /// A wrapped line under the last row, indented by `indent` characters.
  void note(const std::string& text, int indent);
  bool empty() const { return rows_.empty(); }
  /// Headings and rows. Where the lines would be too wide, the widest flush-left columns are made narrower
  /// and their cells broken at spaces.
  std::string text() const;

 private:
  struct Row {
    std::vector<std::string> cells;
    std::string notes;
  };
  std::vector<int> widths() const;
  std::string line(const std::vector<std::string>& cells, const std::vector<int>& widths) const;

  std::vector<std::string> headings_;
  std::vector<bool> right_;
  int indent_;
  std::vector<Row> rows_;
};

}  // namespace dropfront::report
