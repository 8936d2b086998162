#pragma once
#include <optional>
#include <string>
#include <string_view>
#include <vector>

#include "dropfront/problem/document.hpp"
#include "dropfront/problem/keys.hpp"
#include "dropfront/values/input_error.hpp"

namespace dropfront::problem {

/// One value of a document and the way to it. Small and copyable; document and file name must outlive it.
class Cursor {
 public:
  Cursor(const Node& node, const std::string& file) : node_(&node), file_(&file), place_(node.place) {}

  const Node& node() const { return *node_; }
  const std::string& file() const { return *file_; }
  /// JSON pointer (RFC 6901) of the value; empty for the whole document.
  const std::string& pointer() const { return pointer_; }

  Cursor member(std::size_t index) const;  ///< of an object, by position
  Cursor item(std::size_t index) const;    ///< of a list
  /// An empty object standing for an absent member, so that its defaults are read like any others.
  Cursor absent_object(std::string_view key) const;
  /// The way with dots, as in default notes and `--set`: "output.loads.0.current".
  std::string dotted() const;

  /// "file:line:column: /pointer: message".
  values::InputError error(const std::string& message) const { return error_at(place_, message); }
  values::InputError error_at(Place place, const std::string& message) const;
  /// "found <what stands here>; <allowed> is allowed".
  values::InputError wrong(const std::string& allowed) const;

 private:
  const Node* node_;
  const std::string* file_;
  Place place_;
  std::string pointer_;
};

/// What stands there, for messages: "the text "abc"", "the number 3.7", "a list", ...
std::string describe(const Node& node);

/// An object whose members are taken one by one. Unknown keys are refused at once with the nearest known
/// one; `finish` throws std::logic_error if a known key that is present was never taken, so that no key can
/// be accepted and then ignored.
class ObjectReader {
 public:
  ObjectReader(const Cursor& object, const KeySet& keys);

  std::optional<Cursor> take(std::string_view key);
  Cursor take_object(std::string_view key);  ///< the member, or an empty object in its place
  Cursor require(std::string_view key);      ///< refuses the object if the key is missing
  bool has(std::string_view key) const { return object_.node().find(key) != nullptr; }
  void finish() const;
  const Cursor& object() const { return object_; }

 private:
  Cursor object_;
  const KeySet& keys_;
  std::vector<bool> taken_;
};

}  // namespace dropfront::problem
