package org.flexbound.app;

import java.util.Optional;
import org.flexbound.frame.FrameModel;
import org.flexbound.frame.Member;
import org.flexbound.reduce.Places;
import org.flexbound.setup.Station;
import org.flexbound.setup.Vector;

/** Looks up in a frame model where stations are. */
final class ModelPlaces implements Places {
  private final FrameModel model;

  ModelPlaces(FrameModel model) {
    this.model = model;
  }

  @Override
  public Optional<Vector> of(Station station) {
    if (station instanceof Station.AtPoint at) {
      return Optional.of(at.point());
    }
    if (station instanceof Station.AtNode at) {
      return model.nodes().containsKey(at.node())
          ? Optional.of(model.place(at.node()).plus(at.offset()))
          : Optional.empty();
    }
    Station.OnMember on = (Station.OnMember) station;
    Member member = model.members().get(on.member());
    if (member == null) {
      return Optional.empty();
    }
    Vector start = model.start(member);
    return Optional.of(start.plus(model.end(member).minus(start).times(on.at())));
  }
}
