#include "dropfront/parts/csv.hpp"

#include <fmt/format.h>

namespace dropfront::parts {
namespace {

/// Walks a text and keeps the place for people.
class Cursor {
 public:
  Cursor(std::string_view text, const std::string& file) : text_(text), file_(file) {}

  bool at_end() const { return at_ >= text_.size(); }
  char peek() const { return at_end() ? '\0' : text_[at_]; }
  /// LF, or CR before LF.
  bool at_line_end() const { return peek() == '\n' || text_.substr(at_, 2) == "\r\n"; }
  bool at_cell_end() const { return at_end() || peek() == ',' || at_line_end(); }
  int line() const { return line_; }
  int column() const { return column_; }

  char take() {
    const char c = text_[at_++];
    if (c == '\n') {
      ++line_;
      column_ = 1;
    } else if ((static_cast<unsigned char>(c) & 0xc0) != 0x80) {  // a character may be several bytes
      ++column_;
    }
    return c;
  }
  void take_line_end() {
    if (peek() == '\r') take();
    if (!at_end()) take();
  }
  void skip_blanks() {
    while (peek() == ' ' || peek() == '\t') take();
  }
  void skip_line() {
    while (!at_end() && !at_line_end()) take();
    take_line_end();
  }
  values::InputError error(const std::string& message) const {
    return {file_, fmt::format("{}:{}", line_, column_), message};
  }

 private:
  std::string_view text_;
  const std::string& file_;
  std::size_t at_ = 0;
  int line_ = 1;
  int column_ = 1;
};

std::string quoted_cell(Cursor& cursor) {
  const values::InputError unclosed = cursor.error("a cell opens with a quote that is never closed");
  std::string text;
  cursor.take();
  for (;;) {
    if (cursor.at_end()) throw unclosed;
    const char c = cursor.take();
    if (c != '"') {
      text += c;
    } else if (cursor.peek() == '"') {
      text += cursor.take();
    } else {
      break;
    }
  }
  cursor.skip_blanks();
  if (!cursor.at_cell_end()) throw cursor.error("text stands behind a closing quote");
  return text;
}

std::string plain_cell(Cursor& cursor) {
  std::string text;
  while (!cursor.at_cell_end()) {
    if (cursor.peek() == '"') throw cursor.error("a quote stands inside a cell that does not begin with one");
    text += cursor.take();
  }
  text.erase(text.find_last_not_of(" \t\r") + 1);
  return text;
}

CsvRow read_row(Cursor& cursor) {
  CsvRow row;
  for (;;) {
    cursor.skip_blanks();
    CsvCell cell;
    cell.line = cursor.line();
    cell.column = cursor.column();
    cell.text = cursor.peek() == '"' ? quoted_cell(cursor) : plain_cell(cursor);
    row.push_back(cell);
    if (cursor.peek() != ',') break;
    cursor.take();
  }
  cursor.take_line_end();
  return row;
}

}  // namespace

std::vector<CsvRow> parse_csv(std::string_view text, const std::string& file) {
  if (text.substr(0, 3) == "\xef\xbb\xbf") text.remove_prefix(3);
  Cursor cursor(text, file);
  std::vector<CsvRow> rows;
  while (!cursor.at_end()) {
    cursor.skip_blanks();
    if (cursor.at_line_end() || cursor.at_end() || cursor.peek() == '#') {
      cursor.skip_line();
      continue;
    }
    const CsvRow row = read_row(cursor);
    if (!rows.empty() && row.size() != rows.front().size()) {
      throw values::InputError(
          file, fmt::format("{}:{}", row.front().line, row.front().column),
          fmt::format("the row has {} cells, the first row has {}", row.size(), rows.front().size()));
    }
    rows.push_back(row);
  }
  return rows;
}

const CsvCell* CsvPart::cell(std::string_view column) const {
  for (std::size_t i = 0; i < header_.size(); ++i) {
    if (header_[i].text == column) return &row_[i];
  }
  return nullptr;
}

std::optional<RawField> CsvPart::find(std::string_view column) const {
  const CsvCell* found = cell(column);
  if (!found || found->text.empty()) return std::nullopt;
  return RawField{found->text, false};
}

std::vector<std::string> CsvPart::names() const {
  std::vector<std::string> names;
  for (const CsvCell& head : header_) names.push_back(head.text);
  return names;
}

values::InputError CsvPart::error(std::string_view column, const std::string& message) const {
  const CsvCell* found = column.empty() ? nullptr : cell(column);
  const CsvCell& place = found ? *found : row_.front();
  return {file_, fmt::format("{}:{}", place.line, place.column), message};
}

}  // namespace dropfront::parts
