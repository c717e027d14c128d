package org.levelgaze.studies;

import com.fasterxml.jackson.annotation.JsonInclude;
import com.fasterxml.jackson.annotation.JsonUnwrapped;
import java.util.List;
import org.jspecify.annotations.Nullable;
import org.levelgaze.agreement.AppraiserFindings;
import org.levelgaze.agreement.AppraiserPair;
import org.levelgaze.agreement.BiasRatio;
import org.levelgaze.agreement.CohenKappa;
import org.levelgaze.agreement.DefectKindFindings;
import org.levelgaze.agreement.Findings;
import org.levelgaze.agreement.FleissKappa;
import org.levelgaze.agreement.GwetAC1;
import org.levelgaze.agreement.Interval;
import org.levelgaze.agreement.KrippendorffAlpha;
import org.levelgaze.agreement.SignalDetection;
import tools.jackson.core.JsonGenerator;
import tools.jackson.core.JsonParser;
import tools.jackson.databind.DeserializationContext;
import tools.jackson.databind.JsonNode;
import tools.jackson.databind.SerializationContext;
import tools.jackson.databind.ValueDeserializer;
import tools.jackson.databind.ValueSerializer;
import tools.jackson.databind.json.JsonMapper;
import tools.jackson.databind.module.SimpleModule;

/**
 * The JSON form of findings: component names and nesting of the records, every number in full, {@code null} where a figure is
 * undefined, and a reason beside it. Findings kept as JSON can be read back.
 */
public final class FindingsJson {

    private static final JsonMapper MAPPER = JsonMapper.builder()
            .addModule(new SimpleModule("findings")
                    .addSerializer(Interval.class, new IntervalWriter())
                    .addDeserializer(Interval.class, new IntervalReader())
                    .addDeserializer(AppraiserPair.class, new PairReader())
                    .addSerializer(BiasRatio.Status.class, new StatusWriter())
                    .addDeserializer(BiasRatio.Status.class, new StatusReader()))
            .addMixIn(AppraiserFindings.class, KindsOnlyWhenKnown.class)
            .addMixIn(AppraiserPair.class, KappaBesideNames.class)
            .addMixIn(CohenKappa.class, ReasonOnlyWhenUndefined.class)
            .addMixIn(FleissKappa.class, ReasonOnlyWhenUndefined.class)
            .addMixIn(KrippendorffAlpha.class, ReasonOnlyWhenUndefined.class)
            .addMixIn(GwetAC1.class, ReasonOnlyWhenUndefined.class)
            .addMixIn(SignalDetection.class, ReasonOnlyWhenUndefined.class)
            .build();

    private FindingsJson() {}

    /** The findings as JSON, on one line. */
    public static String write(Findings findings) {
        return MAPPER.writeValueAsString(findings);
    }

    /** The findings as JSON, one figure a line. */
    public static String writeIndented(Findings findings) {
        return MAPPER.writerWithDefaultPrettyPrinter().writeValueAsString(findings);
    }

    /**
     * Findings from their JSON form.
     *
     * @throws tools.jackson.core.JacksonException when the text is no findings
     */
    public static Findings read(String json) {
        return MAPPER.readValue(json, Findings.class);
    }

    /** The names of two appraisers stand beside the figures of their kappa. */
    interface KappaBesideNames {
        @JsonUnwrapped
        CohenKappa kappa();
    }

    interface KindsOnlyWhenKnown {
        @JsonInclude(JsonInclude.Include.NON_NULL)
        @Nullable
        List<DefectKindFindings> byDefectKind();
    }

    interface ReasonOnlyWhenUndefined {
        @JsonInclude(JsonInclude.Include.NON_NULL)
        @Nullable
        String undefined();
    }

    /** An interval is a pair; an open upper end is null. */
    private static final class IntervalWriter extends ValueSerializer<Interval> {

        @Override
        public void serialize(Interval interval, JsonGenerator json, SerializationContext context) {
            json.writeStartArray();
            json.writeNumber(interval.lower());
            if (Double.isInfinite(interval.upper())) {
                json.writeNull();
            } else {
                json.writeNumber(interval.upper());
            }
            json.writeEndArray();
        }
    }

    private static final class IntervalReader extends ValueDeserializer<Interval> {

        @Override
        public Interval deserialize(JsonParser json, DeserializationContext context) {
            @Nullable Double[] ends = context.readValue(json, Double[].class);
            Double lower = ends[0];
            Double upper = ends[1];
            if (lower == null) {
                throw new IllegalArgumentException("An interval has no lower end");
            }
            return new Interval(lower, upper == null ? Double.POSITIVE_INFINITY : upper);
        }
    }

    /** Two names, and beside them the figures of their kappa. */
    private static final class PairReader extends ValueDeserializer<AppraiserPair> {

        @Override
        public AppraiserPair deserialize(JsonParser json, DeserializationContext context) {
            JsonNode pair = context.readTree(json);
            return new AppraiserPair(
                    pair.required("first").asString(),
                    pair.required("second").asString(),
                    context.readTreeAsValue(pair, CohenKappa.class));
        }
    }

    private static final class StatusWriter extends ValueSerializer<BiasRatio.Status> {

        @Override
        public void serialize(BiasRatio.Status status, JsonGenerator json, SerializationContext context) {
            json.writeString(status.text());
        }
    }

    private static final class StatusReader extends ValueDeserializer<BiasRatio.Status> {

        @Override
        public BiasRatio.Status deserialize(JsonParser json, DeserializationContext context) {
            String text = json.getString();
            for (BiasRatio.Status status : BiasRatio.Status.values()) {
                if (status.text().equals(text)) {
                    return status;
                }
            }
            throw new IllegalArgumentException("'" + text + "' is no status of a bias ratio");
        }
    }
}
