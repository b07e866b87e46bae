package org.flexbound.solve;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import org.flexbound.frame.StiffnessPath;
import org.flexbound.frame.StiffnessSetting;

/**
 * Every single stiffness of the structure, numbered: six for a member, six for a joint at a member's
 * end, six for a connection, six for a support. A path of the model leads to one or several.
 */
final class Slots {
  private final List<StiffnessPath> parts = new ArrayList<>();
  private double[] nominal = new double[64];
  private final Map<StiffnessPath, List<Target>> targets = new LinkedHashMap<>();

  /**
   * Where a path leads.
   *
   * @param slot the slot
   * @param ratio the slot's stiffness per unit of the path's
   */
  record Target(int slot, double ratio) {}

  /** A new slot; its contribution goes by the name of the part. */
  int add(StiffnessPath part, double stiffness) {
    int slot = parts.size();
    parts.add(part);
    if (slot == nominal.length) {
      nominal = Arrays.copyOf(nominal, 2 * slot);
    }
    nominal[slot] = stiffness;
    return slot;
  }

  void lead(StiffnessPath path, int slot, double ratio) {
    targets.computeIfAbsent(path, p -> new ArrayList<>(1)).add(new Target(slot, ratio));
  }

  int count() {
    return parts.size();
  }

  StiffnessPath part(int slot) {
    return parts.get(slot);
  }

  List<Target> targets(StiffnessPath path) {
    return targets.getOrDefault(path, List.of());
  }

  double nominal(int slot) {
    return nominal[slot];
  }

  /** The stiffness of every slot; paths that lead to many slots are set before those of one. */
  double[] set(List<StiffnessPath> paths, List<StiffnessSetting> settings) {
    double[] result = Arrays.copyOf(nominal, parts.size());
    List<Integer> order = new ArrayList<>();
    for (int k = 0; k < paths.size(); k++) {
      order.add(k);
    }
    order.sort((a, b) -> Integer.compare(rank(paths.get(a)), rank(paths.get(b))));
    for (int k : order) {
      for (Target target : targets(paths.get(k))) {
        if (settings.get(k) instanceof StiffnessSetting.Factor factor) {
          result[target.slot()] *= factor.factor();
        } else if (settings.get(k) instanceof StiffnessSetting.Value value) {
          if (paths.get(k).group() == StiffnessPath.Group.MATERIALS) {
            // A modulus in place of the nominal one scales what is made of it.
            result[target.slot()] *= value.stiffness() * target.ratio();
          } else {
            result[target.slot()] = value.stiffness() * target.ratio();
          }
        }
      }
    }
    return result;
  }

  private static int rank(StiffnessPath path) {
    return switch (path.group()) {
      case JOINTS, MATERIALS -> 0;
      case CONNECTIONS, SUPPORTS, MEMBERS -> 1;
    };
  }
}
