#pragma once
#include <string>
#include <string_view>
#include <vector>

#include "dropfront/parts/field_source.hpp"

namespace dropfront::parts {

struct CsvCell {
  std::string text;
  int line = 1;    ///< from 1
  int column = 1;  ///< from 1, in characters
};
using CsvRow = std::vector<CsvCell>;

/// Rows of an RFC 4180 text: commas, double quotes around cells (doubled inside), LF or CRLF, a quoted cell
/// may hold line ends. Beyond the standard: blank lines and lines that begin with # are skipped, spaces
/// around unquoted cells are dropped. Throws InputError: a quote inside or behind a cell, an unclosed quote,
/// a row with another number of cells than the first. `file` is for messages.
std::vector<CsvRow> parse_csv(std::string_view text, const std::string& file);

/// One row under its header as a source of fields.
class CsvPart : public FieldSource {
 public:
  CsvPart(const std::string& file, const CsvRow& header, const CsvRow& row)
      : file_(file), header_(header), row_(row) {}
  std::optional<RawField> find(std::string_view column) const override;
  std::vector<std::string> names() const override;
  values::InputError error(std::string_view column, const std::string& message) const override;

 private:
  const CsvCell* cell(std::string_view column) const;

  const std::string& file_;
  const CsvRow& header_;
  const CsvRow& row_;
};

}  // namespace dropfront::parts
