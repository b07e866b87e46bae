package org.flexbound.frame;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import org.flexbound.document.Json;
import org.flexbound.finding.Where;

/** An entry of a model while it is put together from cells: objects and lists by paths. */
final class Branch {
  private final Where where;
  private final Map<String, Branch> branches = new LinkedHashMap<>();
  private final Map<String, Json> leaves = new LinkedHashMap<>();

  Branch(Where where) {
    this.where = where;
  }

  /** Whether a step of a path is a place in a list. */
  static boolean isPlace(String step) {
    return Character.isDigit(step.charAt(0));
  }

  /** Puts a value; false where something of another form stands there already. */
  boolean put(List<String> path, Json value) {
    String step = path.get(0);
    if (path.size() > 1) {
      return !leaves.containsKey(step)
          && branches
              .computeIfAbsent(step, s -> new Branch(value.where()))
              .put(path.subList(1, path.size()), value);
    }
    return !branches.containsKey(step) && leaves.putIfAbsent(step, value) == null;
  }

  /** Whether a list at a path has values of its own. */
  boolean holdsLeaves(List<String> path) {
    if (path.isEmpty()) {
      return !leaves.isEmpty();
    }
    Branch next = branches.get(path.get(0));
    return next != null && next.holdsLeaves(path.subList(1, path.size()));
  }

  Json json() {
    Map<String, Json> values = new LinkedHashMap<>(leaves);
    branches.forEach((step, branch) -> values.put(step, branch.json()));
    if (!values.isEmpty() && values.keySet().stream().allMatch(Branch::isPlace)) {
      List<Json> items = new ArrayList<>();
      values.entrySet().stream()
          .sorted(Map.Entry.comparingByKey())
          .forEach(entry -> items.add(entry.getValue()));
      return new Json.Items(where, items);
    }
    return new Json.Members(where, values);
  }
}
