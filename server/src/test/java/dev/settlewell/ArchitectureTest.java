package dev.settlewell;

import static com.tngtech.archunit.base.DescribedPredicate.describe;
import static com.tngtech.archunit.base.DescribedPredicate.not;
import static com.tngtech.archunit.core.domain.JavaClass.Predicates.resideInAPackage;
import static com.tngtech.archunit.core.domain.JavaClass.Predicates.resideInAnyPackage;
import static com.tngtech.archunit.lang.syntax.ArchRuleDefinition.noClasses;
import static org.assertj.core.api.Assertions.assertThat;

import com.tngtech.archunit.base.DescribedPredicate;
import com.tngtech.archunit.core.domain.JavaAccess;
import com.tngtech.archunit.core.domain.JavaClass;
import com.tngtech.archunit.core.domain.JavaClasses;
import com.tngtech.archunit.core.importer.ClassFileImporter;
import com.tngtech.archunit.core.importer.ImportOption;
import com.tngtech.archunit.lang.syntax.elements.GivenClassesConjunction;
import java.io.File;
import java.io.FileInputStream;
import java.io.FileOutputStream;
import java.io.FileReader;
import java.io.FileWriter;
import java.io.RandomAccessFile;
import java.nio.file.Files;
import java.util.List;
import java.util.Set;
import java.util.concurrent.CompletableFuture;
import java.util.concurrent.Executors;
import java.util.concurrent.ForkJoinPool;
import java.util.concurrent.ThreadPoolExecutor;
import java.util.stream.Collectors;
import java.util.stream.IntStream;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

/**
 * Keeps the map of the packages in DEVELOPERS.md true: what is below knows nothing of what is
 * above, and each outside thing has the few packages that may touch it.
 */
class ArchitectureTest {
  /** From the top floor down; those on one floor know nothing of each other. */
  private static final List<List<String>> FLOORS =
      List.of(
          List.of("command"),
          List.of("lsp"),
          List.of("review", "assist"),
          List.of("workspace"),
          List.of("finding"),
          List.of("channel"),
          List.of("sheet"),
          List.of("vocabulary"),
          List.of("firmware"),
          List.of("syntax"),
          List.of("circuit", "sensor", "uncertainty"),
          List.of("unit"),
          List.of("text"));

  private static final JavaClasses CLASSES =
      new ClassFileImporter()
          .withImportOption(ImportOption.Predefined.DO_NOT_INCLUDE_TESTS)
          .importPackages("dev.settlewell");

  private static final Set<String> TRANSCENDENTAL =
      Set.of(
          "sin", "cos", "tan", "asin", "acos", "atan", "atan2", "sinh", "cosh", "tanh", "exp",
          "expm1", "log", "log10", "log1p", "pow", "cbrt", "hypot");

  static Stream<String> packages() {
    return FLOORS.stream().flatMap(List::stream);
  }

  @ParameterizedTest
  @MethodSource("packages")
  void knowsNothingOfWhatIsAboveOrBeside(String name) {
    int floor = IntStream.range(0, FLOORS.size()).filter(i -> FLOORS.get(i).contains(name)).sum();
    List<String> others =
        FLOORS.subList(0, floor + 1).stream()
            .flatMap(List::stream)
            .filter(other -> !other.equals(name))
            .toList();
    of(name)
        .should()
        .dependOnClassesThat(ours(others).or(resideInAPackage("dev.settlewell")))
        .because("a package uses only what lies below it")
        .allowEmptyShould(true)
        .check(CLASSES);
  }

  @Test
  void everyPackageHasAFloor() {
    Set<String> known = packages().collect(Collectors.toSet());
    List<String> homeless =
        CLASSES.stream()
            .map(type -> type.getPackageName().replaceFirst("^dev\\.settlewell\\.?", ""))
            .map(name -> name.replaceFirst("\\..*", ""))
            .filter(name -> !name.isEmpty() && !known.contains(name))
            .distinct()
            .toList();
    assertThat(homeless).as("packages that this test gives no floor").isEmpty();
  }

  @Test
  void physicsIsPure() {
    noClasses()
        .that(ours(List.of("circuit", "sensor", "uncertainty")))
        .should()
        .dependOnClassesThat(
            resideInAPackage("dev.settlewell..")
                .and(not(ours(List.of("circuit", "sensor", "uncertainty")))))
        .because("physics takes and gives doubles in SI units")
        .check(CLASSES);
  }

  @Test
  void eachLibraryHasItsPackages() {
    only("picocli..", "command");
    only("org.eclipse.lsp4j..", "lsp");
    only("org.yaml..", "syntax");
    only("org.apache.commons.math3..", "circuit", "sensor", "uncertainty");
    only("com.google.gson..", "vocabulary", "review", "lsp");
  }

  @Test
  void onlyMainOwnsTheProcess() {
    noClasses()
        .that(not(isMain()))
        .should()
        .accessTargetWhere(
            touches(
                "the streams, the end, the environment or the properties of the process",
                System.class,
                Set.of("out", "in", "exit", "getenv", "getProperty", "setProperty")))
        .because("only Main may write between the messages of a protocol, or end the process")
        .check(CLASSES);
  }

  @Test
  void threadsAreMadeInTheFacesAlone() {
    noClasses()
        .that(not(ours(List.of("command", "lsp"))))
        .should()
        .dependOnClassesThat(
            are(
                Thread.class,
                Executors.class,
                ThreadPoolExecutor.class,
                ForkJoinPool.class,
                CompletableFuture.class))
        .because("whoever computes does not decide where")
        .check(CLASSES);
  }

  @Test
  void filesAreReadByTheWorkspaceAndWrittenByTheCommands() {
    noClasses()
        .that(not(ours(List.of("workspace", "command"))).and(not(isMain())))
        .should()
        .dependOnClassesThat(
            are(
                Files.class,
                File.class,
                FileInputStream.class,
                FileOutputStream.class,
                FileReader.class,
                FileWriter.class,
                RandomAccessFile.class))
        .because("everything else is a function of texts")
        .check(CLASSES);
  }

  @Test
  void figuresHaveTheSameBitsEverywhere() {
    noClasses()
        .should()
        .accessTargetWhere(touches("a function of Math that differs", Math.class, TRANSCENDENTAL))
        .because("Math differs in the last bits between versions of Java: StrictMath does not")
        .check(CLASSES);
  }

  @Test
  void theDateIsAnArgument() {
    noClasses()
        .that(not(ours(List.of("command", "lsp"))).and(not(isMain())))
        .should()
        .accessTargetWhere(describe("a clock", ArchitectureTest::readsClock))
        .because("what was judged yesterday can be judged again")
        .check(CLASSES);
  }

  @Test
  void nothingTakesTheMachinesLanguage() {
    noClasses()
        .that(not(isMain()))
        .should()
        .accessTargetWhere(
            describe(
                "language, time zone or encoding of the machine",
                ArchitectureTest::takesTheMachines))
        .because("the same input gives the same bytes on every machine")
        .check(CLASSES);
  }

  @Test
  void noReflection() {
    noClasses()
        .should()
        .dependOnClassesThat(
            resideInAPackage("java.lang.reflect..")
                .or(are(java.util.ServiceLoader.class))
                .or(resideInAPackage("java.lang.invoke..").and(notOfTheCompiler())))
        .because("what calls what can be read in the sources")
        .check(CLASSES);
  }

  private static boolean takesTheMachines(JavaAccess<?> access) {
    String owner = access.getTargetOwner().getName();
    String name = access.getName();
    String given = access.getTarget().getFullName();
    boolean lowerOrUpper =
        owner.equals("java.lang.String")
            && (name.equals("toLowerCase") || name.equals("toUpperCase"))
            && given.endsWith("()");
    boolean bytes =
        owner.equals("java.lang.String") && name.equals("getBytes") && given.endsWith("()");
    boolean format =
        owner.equals("java.lang.String")
            && name.equals("format")
            && !given.contains("java.util.Locale");
    boolean locale =
        owner.equals("java.util.Locale") && name.equals("getDefault")
            || owner.startsWith("java.text.")
            || owner.equals("java.time.ZoneId") && name.equals("systemDefault");
    boolean zone = owner.startsWith("java.time.") && given.endsWith(".now()");
    return lowerOrUpper || bytes || format || locale || zone;
  }

  private static boolean readsClock(JavaAccess<?> access) {
    String owner = access.getTargetOwner().getName();
    return owner.startsWith("java.time.") && access.getName().equals("now")
        || owner.equals("java.lang.System")
            && Set.of("currentTimeMillis", "nanoTime").contains(access.getName());
  }

  private static GivenClassesConjunction of(String name) {
    return noClasses().that(ours(List.of(name)));
  }

  private static DescribedPredicate<JavaClass> ours(List<String> names) {
    return resideInAnyPackage(
        names.stream().map(name -> "dev.settlewell." + name + "..").toArray(String[]::new));
  }

  private static void only(String library, String... packages) {
    noClasses()
        .that(not(ours(List.of(packages))))
        .should()
        .dependOnClassesThat(resideInAPackage(library))
        .because("only " + String.join(", ", packages) + " may use " + library)
        .check(CLASSES);
  }

  private static DescribedPredicate<JavaClass> isMain() {
    return describe("are Main", type -> type.getName().equals("dev.settlewell.Main"));
  }

  private static DescribedPredicate<JavaClass> are(Class<?>... types) {
    Set<String> names = Set.of(Stream.of(types).map(Class::getName).toArray(String[]::new));
    return describe("are one of " + names, type -> names.contains(type.getName()));
  }

  /** Lambdas, records and joined strings are made by these. */
  private static DescribedPredicate<JavaClass> notOfTheCompiler() {
    Set<String> names =
        Set.of(
            "java.lang.invoke.LambdaMetafactory",
            "java.lang.invoke.StringConcatFactory",
            "java.lang.invoke.MethodHandles",
            "java.lang.invoke.MethodHandles$Lookup",
            "java.lang.invoke.MethodHandle",
            "java.lang.invoke.MethodType",
            "java.lang.invoke.CallSite",
            "java.lang.invoke.TypeDescriptor");
    return describe("are not made by the compiler", type -> !names.contains(type.getName()));
  }

  private static DescribedPredicate<JavaAccess<?>> touches(
      String what, Class<?> owner, Set<String> members) {
    return describe(
        what,
        access ->
            access.getTargetOwner().getName().equals(owner.getName())
                && members.contains(access.getName()));
  }
}
