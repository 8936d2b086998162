#pragma once
#include <string>
#include <string_view>
#include <vector>

namespace dropfront::problem {

/// Where something stands in a text, both counted from 1, columns in characters. Line 0: not from a file but
/// from the command line.
struct Place {
  int line = 0;
  int column = 0;
};

/// One value of a JSON text, with its place.
struct Node {
  enum class Kind { null, boolean, number, text, list, object };
  struct Key {
    std::string name;
    Place place;
  };
  Kind kind = Kind::null;
  Place place;
  bool boolean = false;
  double number = 0;
  std::string text;         ///< the characters of a text; a number in its shortest round-trip form
  std::vector<Key> keys;    ///< object: one a member, in the order written
  std::vector<Node> items;  ///< list: the entries; object: the member values, beside `keys`

  /// The member of that name, or null (also when this is no object).
  const Node* find(std::string_view key) const;
  Node* find(std::string_view key);
};

/// A text node made in code rather than read; `place` says what to blame.
Node text_node(std::string text, Place place);

/// Reads one JSON text (RFC 8259, and comments from // to the end of the line; a byte order mark is skipped).
/// Refused: duplicate keys, invalid UTF-8, numbers beyond double range, nesting beyond 64 levels, anything
/// after the value. `file` is used in messages only. Throws values::InputError with line:column.
Node parse_document(std::string_view text, const std::string& file);

/// Canonical JSON on one line: keys in the order of the node, numbers in their shortest round-trip form,
/// comments gone. Equal documents give equal bytes.
std::string canonical_json(const Node& node);

}  // namespace dropfront::problem
